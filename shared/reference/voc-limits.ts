/** A limit on VOC content, g/L less water and exempt compounds, from a day on. */
export interface VocLimit {
  category: 'floor coatings' | 'primers' | 'sealers'
  limit: number
  from: string
}

export interface VocPlace {
  id: string
  name: string
  /** Where the rule is written, and how surely it is known here. */
  source: string
  limits: readonly VocLimit[]
}

/**
 * Rules loaded, by place; for any other place no rule is loaded. Days and limits are from memory unless the source says otherwise: confirm against the
 * rule's own text before relying on one. A model rule binds only where a state or district has taken it up.
 */
export const vocPlaces: readonly VocPlace[] = [
  {
    id: 'us-national',
    name: 'United States, national rule',
    source: '40 CFR 59 subpart D, table 1 (from memory, verify)',
    limits: [
      { category: 'floor coatings', limit: 400, from: '1999-09-13' },
      { category: 'primers', limit: 350, from: '1999-09-13' },
      { category: 'sealers', limit: 400, from: '1999-09-13' },
    ],
  },
  {
    id: 'us-otc-1',
    name: 'Ozone Transport Commission model rule, 2002',
    source: 'OTC model rule of 2002 (from memory, verify that the state has taken it up and not phase II)',
    limits: [{ category: 'floor coatings', limit: 250, from: '2005-01-01' }],
  },
  {
    id: 'us-otc-2',
    name: 'Ozone Transport Commission model rule, phase II',
    source: 'OTC model rule, phase II (from memory, verify that the state has taken it up)',
    limits: [{ category: 'floor coatings', limit: 100, from: '2014-01-01' }],
  },
  {
    id: 'us-ca-2007',
    name: 'California, suggested control measure 2007',
    source: 'CARB suggested control measure 2007 (from memory, verify that the district has taken it up and not the one of 2019)',
    limits: [
      { category: 'floor coatings', limit: 100, from: '2010-01-01' },
      { category: 'sealers', limit: 100, from: '2010-01-01' },
    ],
  },
  {
    id: 'us-ca-2019',
    name: 'California, suggested control measure 2019',
    source: 'CARB suggested control measure 2019 (from memory, verify that the district has taken it up)',
    limits: [
      { category: 'floor coatings', limit: 50, from: '2022-01-01' },
      { category: 'sealers', limit: 100, from: '2022-01-01' },
    ],
  },
  {
    id: 'us-ca-south-coast',
    name: 'South Coast air district',
    source: 'Rule 1113, table of limits (floor coatings read in a draft text of 2015; others from memory, verify)',
    limits: [
      { category: 'floor coatings', limit: 50, from: '2014-01-01' },
      { category: 'primers', limit: 100, from: '2014-01-01' },
      { category: 'sealers', limit: 100, from: '2014-01-01' },
    ],
  },
  {
    id: 'ca',
    name: 'Canada',
    source: 'SOR/2009-264, VOC limits for architectural coatings (from memory, verify)',
    limits: [{ category: 'floor coatings', limit: 250, from: '2010-09-09' }],
  },
  {
    id: 'eu',
    name: 'European Union, two-pack performance coatings, water-borne',
    source: 'Directive 2004/42/EC, annex II, category A/j, water-borne (from memory, verify)',
    limits: [{ category: 'floor coatings', limit: 140, from: '2010-01-01' }],
  },
  {
    id: 'eu-solvent-borne',
    name: 'European Union, two-pack performance coatings, solvent-borne',
    source: 'Directive 2004/42/EC, annex II, category A/j, solvent-borne (from memory, verify)',
    limits: [{ category: 'floor coatings', limit: 500, from: '2010-01-01' }],
  },
]
