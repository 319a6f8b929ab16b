import { shallowReadonly, shallowRef } from 'vue'
import type { ThemeName } from '@shared/drawing/paints'
import type { CaptionParagraph } from '@shared/drawing/captioned-scene'
import type { Scene } from '@shared/drawing/scene'
import type { ResolveText } from '@shared/texts/format-text'

export type SceneFormat = 'svg' | 'png'

export interface SceneExport {
  readonly scene: Scene
  /** What the picture says under the drawing; most important first. */
  readonly caption?: readonly CaptionParagraph[] | undefined
  readonly format: SceneFormat
  readonly theme: ThemeName
  readonly resolve: ResolveText
  /** Name of the file without its ending. */
  readonly name: string
}

/** Pixels of the picture for one CSS pixel. */
const PNG_SCALE = 2

/** Name of the file of a cross-section: what it shows, and at which depth. */
export function sectionFileName(depth: number): string {
  return `toehold-section-${depth.toFixed(3)}m`
}

/** Saves drawings as files. Everything happens in the browser. */
export function useSceneExport() {
  const state = shallowRef<'idle' | 'busy' | 'failed'>('idle')

  async function save(wanted: SceneExport): Promise<void> {
    state.value = 'busy'
    try {
      download(await fileOf(wanted), `${wanted.name}.${wanted.format}`)
      state.value = 'idle'
    } catch (error) {
      state.value = 'failed'
      throw error
    }
  }

  return { state: shallowReadonly(state), save }
}

async function fileOf(wanted: SceneExport): Promise<Blob> {
  const { format, theme, resolve, caption = [] } = wanted
  const { captionedScene, sceneFontFaces, sceneToSvg } = await import('./scene-file')
  const scene = caption.length === 0 ? wanted.scene : captionedScene(wanted.scene, caption)
  const svg = sceneToSvg(scene, { resolve, theme, fontFaces: sceneFontFaces })
  const file = new Blob([svg], { type: 'image/svg+xml' })
  return format === 'svg' ? file : toPng(file, scene)
}

async function toPng(svg: Blob, { width, height }: Scene): Promise<Blob> {
  const address = URL.createObjectURL(svg)
  try {
    const image = new Image()
    image.src = address
    await image.decode()
    const canvas = document.createElement('canvas')
    canvas.width = width * PNG_SCALE
    canvas.height = height * PNG_SCALE
    canvas.getContext('2d')?.drawImage(image, 0, 0, canvas.width, canvas.height)
    return await new Promise<Blob>((resolve, reject) => {
      canvas.toBlob((blob) => {
        if (blob) resolve(blob)
        else reject(new Error('The browser could not write the picture'))
      }, 'image/png')
    })
  } finally {
    URL.revokeObjectURL(address)
  }
}

/** Long enough for the browser to have taken the file over [ms]. */
const KEPT = 10_000

/** Hands a file to the browser, which asks where to put it. */
export function download(file: Blob, name: string): void {
  const address = URL.createObjectURL(file)
  const link = document.createElement('a')
  link.href = address
  link.download = name
  link.click()
  setTimeout(() => URL.revokeObjectURL(address), KEPT)
}
