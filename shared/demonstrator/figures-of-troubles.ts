import { puncture } from '../calc/air/puncture'
import { crestSunk, slidingGust, throughOneSection, windOn } from './answers'
import { evaluateAt } from './balance'
import { BATHTUB, CYCLIST } from './everyday'
import { quantity, said, type SceneFigures, type Shown } from './messages'
import { airPressureNow, sectionOf } from './setting'

/** Scene 7: a cold night lowers pressure and crest. */
export function nightFigures({ setting, start }: Shown): SceneFigures {
  const sunk = crestSunk(setting, start)
  const { values } = setting
  const { loadedShape, freeboard } = evaluateAt(setting)
  const after = quantity(airPressureNow(values), 'pressure')
  const air = said('figure.night.air', {
    filled: quantity(values.filledAt, 'temperature'),
    now: quantity(values.temperature, 'temperature'),
    before: quantity(values.airPressure, 'pressure'),
    after,
  })
  return {
    head:
      sunk === null
        ? said('figure.night.none')
        : said('figure.night.head', { drop: quantity(sunk, 'smallLength') }),
    lines: [air, said('figure.night.do')],
    exact:
      loadedShape.solved && freeboard.available !== null
        ? said('figure.night.exact', {
            crest: quantity(loadedShape.crest, 'length'),
            freeboard: { value: freeboard.available, kind: 'smallLength', rounding: 'down' },
          })
        : said('figure.night.exactNone', { after }),
    comparison: null,
  }
}

/** Sections of the line in which one goes soft, to tell linked from isolated air. */
const SECTIONS = 5

/** Scene 8: what comes through a section without air. */
export function punctureFigures({ setting }: Shown): SceneFigures {
  const { steady, firstRush } = throughOneSection(setting)
  const { sectionLength } = setting.tube
  const section = { depth: setting.values.depth, length: sectionLength }
  const line = Array.from({ length: SECTIONS }, () => section)
  const { standing } = puncture(line, 0, 'linked', sectionOf(setting).gravity)
  const flow = quantity(steady, 'largeFlow')
  return {
    head: said('figure.puncture.head', { flow: quantity(steady, 'flowRate', 0) }),
    lines: [
      said('figure.puncture.rush', {
        rush: quantity(firstRush, 'flowRate', 0),
        length: quantity(sectionLength, 'length', 0),
      }),
      said('figure.puncture.linked', {
        fallen: standing.filter((stands) => !stands).length,
        count: SECTIONS,
      }),
    ],
    exact: said('figure.puncture.exact', { flow, depth: quantity(section.depth, 'length') }),
    comparison: said('figure.puncture.tubs', {
      count: quantity(steady / BATHTUB, 'ratio', 1),
      each: quantity(BATHTUB, 'volume', 2),
    }),
  }
}

/** A gust that ballast is asked for [m/s]: a stormy evening. Judgement. */
const STORM = 20

/** Scene 9: the empty tube in the wind. */
export function windFigures({ setting }: Shown): SceneFigures {
  const gust = slidingGust(setting)
  const now = windOn(setting, setting.values.gust)
  const storm = windOn(setting, STORM)
  const ballast = said('figure.wind.ballast', {
    ballast: { value: storm.ballast, kind: 'massPerLength', decimals: 0, rounding: 'up' },
    gust: quantity(STORM, 'speed', 0),
  })
  return {
    head:
      gust === null
        ? said('figure.wind.none')
        : said('figure.wind.head', { gust: quantity(gust, 'speed', 1) }),
    lines: [ballast],
    exact: said('figure.wind.exact', {
      force: quantity(now.force, 'forceTerm'),
      grip: quantity(now.resistance, 'forceTerm'),
    }),
    comparison:
      gust === null
        ? null
        : said('figure.wind.cyclist', {
            count: quantity(gust / CYCLIST, 'ratio', 1),
            each: quantity(CYCLIST, 'speed', 0),
          }),
  }
}
