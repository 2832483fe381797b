/**
 * Respirable crystalline silica in construction: 29 CFR 1926.1153, final rule of 2016. Limits read in the rule's text; rows xii and xiii of Table 1 read in
 * a trade magazine (which counts them one lower), ii and iv in California's title 8 section 1532.3, the same table; x, xi and vii from memory. Condensed:
 * the rule's own words decide, and so does the competent person of 1926.1153(g)(4).
 */
export const silicaRule = {
  name: '29 CFR 1926.1153',
  verify: 'condensed from 29 CFR 1926.1153, verify against the rule',
  /** µg/m³, eight-hour average. */
  permissibleExposure: 50,
  actionLevel: 25,
} as const

/** Assigned protection factor that Table 1 asks of a respirator, by time at the task in a shift; null: none asked. */
export interface SilicaRespirator {
  upTo4h: 10 | 25 | null
  over4h: 10 | 25 | null
}

export interface SilicaTask {
  /** Row of Table 1. */
  row: string
  tool: string
  /** One of these ways of control, used as its maker says. */
  controls: readonly string[]
  /** What is asked besides indoors or in enclosed places. */
  indoorsBesides: string | null
  outdoors: SilicaRespirator
  indoors: SilicaRespirator
}

const none: SilicaRespirator = { upTo4h: null, over4h: null }
const half: SilicaRespirator = { upTo4h: 10, over4h: 10 }
const longShift: SilicaRespirator = { upTo4h: null, over4h: 10 }

/** Rows of Table 1 that a resin floor meets. */
export const silicaTasks = {
  'walk-behind saw': {
    row: '(iv)',
    tool: 'walk-behind saws',
    controls: ['integrated water on the blade'],
    indoorsBesides: null,
    outdoors: none,
    indoors: half,
  },
  'handheld drill': {
    row: '(vii)',
    tool: 'handheld and stand-mounted drills',
    controls: ['shroud and dust collector with a filter of at least 99 %, and a vacuum with HEPA filter for the holes'],
    indoorsBesides: null,
    outdoors: none,
    indoors: none,
  },
  'chipping tool': {
    row: '(x)',
    tool: 'jackhammers and handheld powered chipping tools',
    controls: ['water at the point of impact', 'shroud and dust collector with a filter of at least 99 %'],
    indoorsBesides: null,
    outdoors: longShift,
    indoors: half,
  },
  'handheld grinder': {
    row: '(xii)',
    tool: 'handheld grinders, other than for mortar',
    controls: [
      'outdoors only: integrated water on the wheel',
      'shroud and dust collector: at least 25 cfm per inch of wheel, filter of at least 99 %, with a cyclone or filter cleaning',
    ],
    indoorsBesides: null,
    outdoors: none,
    indoors: longShift,
  },
  'floor grinder': {
    row: '(xiii)',
    tool: 'walk-behind milling machines and floor grinders',
    controls: [
      'integrated water on the cutting surface',
      'the maker’s dust collector: at least the maker’s air flow, filter of at least 99 %, with filter cleaning',
    ],
    indoorsBesides: 'vacuum loose dust with a HEPA filter between passes',
    outdoors: none,
    indoors: none,
  },
} as const satisfies Record<string, SilicaTask>
