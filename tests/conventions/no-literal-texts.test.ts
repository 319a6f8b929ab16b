import { baseParse, NodeTypes, type TemplateChildNode } from '@vue/compiler-dom'
import { parse } from 'vue/compiler-sfc'
import { describe, expect, it } from 'vitest'
import { sourceFiles } from '../support/source-files'

/** Attributes that a person reads or hears. */
const SPOKEN = ['aria-label', 'aria-description', 'placeholder', 'title', 'alt', 'label', 'content']

/** A letter, so that signs such as "·" or "%" may stand in a template. */
const hasWord = (text: string): boolean => /\p{L}/u.test(text)

/** Quoted words inside an expression of the template: `{{ ok ? 'Yes' : 'No' }}`. */
function spokenLiterals(expression: string): string[] {
  const withoutKeys = expression.replace(/\b(?:t|say)\(\s*(['"`]).*?\1/gs, '')
  return [...withoutKeys.matchAll(/(['"`])(.*?)\1/gs)]
    .map(([, , text = '']) => text)
    .filter((text) => /^\p{Lu}|\s/u.test(text) && hasWord(text))
}

function literalsOf(node: TemplateChildNode): string[] {
  if (node.type === NodeTypes.TEXT) return hasWord(node.content) ? [node.content.trim()] : []
  if (node.type === NodeTypes.INTERPOLATION)
    return 'content' in node.content ? spokenLiterals(String(node.content.content)) : []
  if (node.type !== NodeTypes.ELEMENT) return []
  const attributes = node.props.flatMap((prop) =>
    prop.type === NodeTypes.ATTRIBUTE &&
    SPOKEN.includes(prop.name) &&
    hasWord(prop.value?.content ?? '')
      ? [`${prop.name}="${prop.value?.content}"`]
      : [],
  )
  return [...attributes, ...node.children.flatMap(literalsOf)]
}

/** Words that stand in a template instead of in shared/texts. */
function literalTexts(source: string): string[] {
  const template = parse(source).descriptor.template?.content ?? ''
  return baseParse(template).children.flatMap(literalsOf)
}

describe('templates', () => {
  it.each([
    ['a word between tags', '<template><p>Holds</p></template>', 'Holds'],
    ['a label', '<template><a aria-label="Menu" /></template>', 'aria-label="Menu"'],
    ['a placeholder', '<template><input placeholder="depth" /></template>', 'placeholder="depth"'],
    ['a title', '<template><b title="Tip">·</b></template>', 'title="Tip"'],
    ['a quoted word', `<template><p>{{ ok ? 'Yes' : '' }}</p></template>`, 'Yes'],
  ])('would be found with %s', (_name, source, literal) => {
    expect(literalTexts(source)).toEqual([literal])
  })

  it('may hold keys, signs and bound texts', () => {
    const source = `<template><p :title="t('a.b')">{{ t('shell.name') }} · {{ x }}</p></template>`
    expect(literalTexts(source)).toEqual([])
  })

  const files = sourceFiles('src', /\.vue$/)

  it('are found', () => {
    expect(files.length).toBeGreaterThan(10)
  })

  it.each(files.map((file) => [file.path, file.text]))(
    '%s holds no literal text',
    (_path, text) => {
      expect(literalTexts(text)).toEqual([])
    },
  )
})
