import { sectionLayers } from '../../drawing/section-layer.ts'
import { evaluate } from '../evaluate.ts'
import { jobQuantities } from '../quantities.ts'
import type { SpecDocument } from './document.ts'
import { executionArticles, schedulesArticle } from './execution.ts'
import { type Floor, type SpecInput, readFloor } from './floor.ts'
import { frontMatter } from './front.ts'
import { generalArticles } from './general.ts'
import { productArticles } from './products.ts'
import { schedules } from './schedules.ts'
import { createRegister } from './sources.ts'

const closing = [
  'This section informs. It says what is met, not met or unknown against the sheets loaded, and no more.',
  'Sheet, label, law and the competent person decide. Local codes and licensed practice come first.',
]

function floorOf(given: SpecInput): Floor {
  const evaluation = evaluate(given.input)
  return {
    given,
    evaluation,
    ...readFloor(given, evaluation),
    quantities: jobQuantities({
      floor: given.input,
      results: evaluation.courses,
      bays: given.bays,
      texture: given.texture,
      loss: given.loss,
    }),
    layers: sectionLayers(given.input, evaluation),
    register: createRegister(),
  }
}

/**
 * The written specification of a job: one tree, from the facts of the build-up and the job alone. Tags are handed out in reading order. Pure: the same
 * input gives the same document.
 */
export function specify(given: SpecInput): SpecDocument {
  const floor = floorOf(given)
  const general = generalArticles(floor)
  const products = productArticles(floor)
  const execution = executionArticles(floor)
  const tables = schedules(floor)
  const front = frontMatter(floor)
  return {
    header: { ...given.header, buildUp: given.buildUp },
    front,
    parts: [
      { number: 1, title: 'General', articles: general },
      { number: 2, title: 'Products', articles: products },
      {
        number: 3,
        title: 'Execution',
        articles: execution.length > 0 ? [...execution, schedulesArticle(tables.map(({ title }) => title))] : [],
      },
    ],
    section: { layers: floor.layers, unit: unitOf(given) },
    schedules: tables,
    ...floor.register.lists(),
    closing,
  }
}

/** The drawing is dimensioned in the unit of the courses. */
function unitOf({ input }: SpecInput): 'mil' | 'µm' {
  const si = input.courses.some(
    ({ thickness, spreadRate }) => thickness?.unit === 'µm' || thickness?.unit === 'mm' || spreadRate?.unit === 'm²/L',
  )
  return si ? 'µm' : 'mil'
}
