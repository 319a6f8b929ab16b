import type { Message } from '../../texts/format-text'
import { drawingText, type Composition } from './composition'
import { slopeRun } from './section-frame'
import { frictionResistance } from './friction'
import { failureMessages } from './notices'

/** The drawing in sentences: what stands where, what acts, and how it ends. */
export function describeSection(drawing: Composition): readonly Message[] {
  return [
    drawingText('describe.sides'),
    ...barrierSentences(drawing),
    ...waterSentences(drawing),
    ...shapeSentences(drawing),
    ...forceSentences(drawing),
    drawingText(`describe.verdict.${drawing.input.evaluation.verdict}`),
    drawingText(`describe.governs.${drawing.input.evaluation.governs}`),
  ]
}

function barrierSentences({ input }: Composition): readonly Message[] {
  const { diameter, skirtLength, airPressure } = input.case.barrier
  const { fall } = input.case.ground
  const sentence = drawingText('describe.barrier', {
    diameter: { value: diameter, kind: 'length' },
    skirt: { value: skirtLength, kind: 'length' },
    pressure: { value: airPressure, kind: 'pressure' },
  })
  const run = slopeRun(fall)
  if (run === null) return [sentence]
  return [sentence, drawingText(fall > 0 ? 'describe.fallsToDry' : 'describe.fallsToWet', { run })]
}

function waterSentences({ input }: Composition): readonly Message[] {
  const { depth, dryDepth, currentSpeed, waveHeight } = input.case.water
  const { level } = input
  const shown = { value: depth, kind: 'length' } as const
  const sentences = [
    level
      ? drawingText('describe.level', {
          level: { value: level.ground + depth, kind: 'length' },
          datum: level.datum,
          depth: shown,
        })
      : drawingText('describe.depth', { depth: shown }),
  ]
  if (dryDepth > 0) {
    sentences.push(drawingText('describe.dryWater', { depth: { value: dryDepth, kind: 'length' } }))
  }
  if (currentSpeed > 0) {
    sentences.push(
      drawingText('describe.current', { speed: { value: currentSpeed, kind: 'speed' } }),
    )
  }
  if (waveHeight > 0) {
    sentences.push(drawingText('describe.waves', { height: { value: waveHeight, kind: 'length' } }))
  }
  if (input.evaluation.thrust.debris > 0) sentences.push(drawingText('describe.debris'))
  return sentences
}

function shapeSentences(drawing: Composition): readonly Message[] {
  const { input } = drawing
  const shape = input.evaluation.loadedShape
  if (!shape.solved) {
    return failureMessages(drawing).map(({ key, values }) => ({
      key: key.replace('drawing.', 'drawing.describe.'),
      ...(values ? { values } : {}),
    }))
  }
  const { available } = input.evaluation.freeboard
  return [
    drawingText('describe.shape', {
      crest: { value: shape.crest, kind: 'length' },
      contact: { value: shape.contact, kind: 'smallLength' },
      lifted: { value: shape.freeSkirt, kind: 'smallLength' },
    }),
    available !== null && available > 0
      ? drawingText('describe.freeboard', {
          height: { value: available, kind: 'smallLength', rounding: 'down' },
        })
      : drawingText('describe.noFreeboard'),
  ]
}

function forceSentences({ input }: Composition): readonly Message[] {
  if (input.case.water.depth <= 0) return []
  const { thrust, vertical } = input.evaluation
  const force = (value: number) => ({ value, kind: 'forcePerLength' }) as const
  return [
    drawingText('describe.forces', {
      thrust: force(thrust.total),
      onSkirt: force(vertical.waterOnSkirt),
      underSkirt: force(vertical.uplift),
      friction: force(Math.max(0, frictionResistance(input))),
    }),
  ]
}
