import type { Conditions, Course, Stage } from '../../../shared/domain/build-up.ts'
import { newCourse } from '../../../shared/domain/course.ts'

/** Ids of mixes and products by name. */
export interface Known {
  mix: (name: string) => string
  product: (name: string) => string
}

export interface DemoBuildUp {
  name: string
  /** Earlier versions come first; each is released before the next begins. */
  versions: { courses: (known: Known) => Course[]; conditions: Conditions; release: boolean }[]
}

const course = (id: string, stage: Stage, part: Partial<Course>): Course => ({ ...newCourse(stage, id), ...part })
type Method = NonNullable<Course['preparation']>['method']
const prep = (method: Method, profile: number, note = ''): Course =>
  course('prep', 'prep', { title: 'Prepare the slab', preparation: { method, profile }, note })
const spread = (value: number): Course['spreadRate'] => ({ value, unit: 'ft²/gal' })
const mils = (value: number): Course['thickness'] => ({ value, unit: 'mil', film: 'wet' })

const heated: Conditions = {
  slabTemperature: { value: 68, unit: '°F' },
  airTemperature: { value: 70, unit: '°F' },
  relativeHumidity: 45,
  substrateRelativeHumidity: 74,
  moistureEmission: { value: 3.2, unit: 'lb/1000 ft²·24 h' },
  vocPlace: 'us-national',
}
const metric: Conditions = {
  ...heated,
  slabTemperature: { value: 18, unit: '°C' },
  airTemperature: { value: 20, unit: '°C' },
  relativeHumidity: 50,
}

const slurryFloor =
  (topSpread: number) =>
  ({ mix, product }: Known): Course[] => [
    prep('steel shot blasting', 5, 'Edges by hand grinder. Vacuum twice.'),
    course('joints', 'fill', {
      title: 'Joint and crack fill',
      mixId: mix('Teasel J8 Joint'),
      startsAfter: 3,
      note: 'Fill static joints flush. Leave moving joints open and call the office.',
    }),
    course('slurry', 'slurry', {
      title: 'Slurry',
      mixId: mix('Ostrel 115 Slurry'),
      thickness: mils(125),
      filler: { productId: product('Corbel 40-mesh silica'), loading: { value: 12, unit: 'lb/gal' } },
      startsAfter: 6,
    }),
    course('flush', 'grind', {
      title: 'Grind flush',
      startsAfter: 24,
      preparation: { method: 'grinding', profile: 2 },
      note: 'Take off the high spots only. Vacuum between passes.',
    }),
    course('prime', 'prime', { title: 'Prime coat', mixId: mix('Ostrel 110 Clear'), spreadRate: spread(150), startsAfter: 28 }),
    course('top', 'top', {
      title: 'Top coat, gloss',
      mixId: mix('Ostrel 220 Gloss, slate grey'),
      spreadRate: spread(topSpread),
      startsAfter: 48,
    }),
  ]

export const demoBuildUps: DemoBuildUp[] = [
  {
    name: 'Slurry-filled freight floor, 1/8 in',
    versions: [
      { courses: slurryFloor(160), conditions: heated, release: true },
      { courses: slurryFloor(150), conditions: heated, release: true },
    ],
  },
  {
    name: 'Light workshop floor, thin film',
    versions: [
      {
        courses: ({ mix }) => [
          prep('grinding', 2),
          course('first', 'prime', {
            title: 'First coat',
            mixId: mix('Teasel Seal 60'),
            thickness: { value: 65, unit: 'µm', film: 'dry' },
          }),
          course('second', 'top', {
            title: 'Top coat, matt',
            mixId: mix('Teasel Seal 60'),
            thickness: { value: 65, unit: 'µm', film: 'dry' },
            startsAfter: 16,
          }),
        ],
        conditions: metric,
        release: true,
      },
    ],
  },
  {
    name: 'High-build floor over a damp slab',
    versions: [
      {
        courses: ({ mix }) => [
          prep('steel shot blasting', 4),
          course('prime', 'prime', { title: 'Damp-slab primer', mixId: mix('Ostrel 140 Damp Primer'), thickness: mils(16) }),
          course('body', 'body', { title: 'Body coat', mixId: mix('Ostrel 310 Body'), thickness: mils(20), startsAfter: 12 }),
        ],
        conditions: { ...heated, substrateRelativeHumidity: 93, moistureEmission: null },
        release: true,
      },
    ],
  },
  {
    name: 'Broadcast quartz, kitchens and wet rooms',
    versions: [
      {
        courses: ({ mix, product }) => [
          prep('steel shot blasting', 4),
          course('prime', 'prime', { title: 'Prime coat', mixId: mix('Ostrel 110 Clear'), thickness: mils(10) }),
          course('body', 'broadcast', {
            title: 'Body with quartz',
            mixId: mix('Ostrel 310 Body'),
            thickness: mils(20),
            startsAfter: 14,
            broadcast: { productId: product('Corbel 20-40 mesh quartz, dried'), rate: { value: 0.5, unit: 'lb/ft²' }, toRefusal: true },
          }),
          course('seal', 'seal', { title: 'Seal coat', mixId: mix('Ostrel 220 Gloss, slate grey'), thickness: mils(10), startsAfter: 32 }),
        ],
        conditions: { ...heated, vocPlace: 'us-otc-2' },
        release: true,
      },
    ],
  },
  {
    name: 'Urethane cement for hot wash-down, 6 mm',
    versions: [
      {
        courses: ({ mix }) => [
          prep('scarifying', 6, 'Cut keys along all edges and drains.'),
          course('body', 'body', {
            title: 'Urethane cement',
            mixId: mix('Teasel Scald 6'),
            thickness: { value: 6, unit: 'mm', film: 'wet' },
          }),
        ],
        conditions: { ...metric, substrateRelativeHumidity: 88, vocPlace: 'eu' },
        release: true,
      },
    ],
  },
  {
    name: 'Water-borne primer, a trial',
    versions: [
      {
        courses: ({ mix }) => [
          prep('acid etching', 4),
          course('prime', 'prime', { title: 'Water-borne primer', mixId: mix('Ostrel 45 Water-borne'), thickness: mils(6) }),
          course('body', 'body', { title: 'Body coat', mixId: mix('Ostrel 310 Body'), thickness: mils(36), startsAfter: 30 }),
          course('top', 'top', {
            title: 'Top coat',
            mixId: mix('Teasel Swift 90'),
            thickness: { value: 200, unit: 'µm', film: 'wet' },
            startsAfter: 42,
          }),
        ],
        conditions: { ...heated, slabTemperature: { value: 48, unit: '°F' }, relativeHumidity: 82 },
        release: false,
      },
    ],
  },
]
