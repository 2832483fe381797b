import type { JobBody } from '../../../shared/api/jobs.ts'

/** Areas of the nine bays of the filling hall, ft²: 7,350 in all. */
const areas = [900, 900, 900, 850, 850, 800, 800, 700, 650]

export const demoJobs: { buildUp: string; body: Omit<JobBody, 'buildUpVersionId' | 'crewIds'> }[] = [
  {
    buildUp: 'Slurry-filled freight floor, 1/8 in',
    body: {
      name: 'Quillwater Bottling, filling hall',
      client: 'Quillwater Bottling',
      site: 'Filling hall, 2 Weir Street, Quillwater',
      status: 'open',
      conditions: {
        slabTemperature: { value: 66, unit: '°F' },
        airTemperature: { value: 68, unit: '°F' },
        relativeHumidity: 48,
        substrateRelativeHumidity: 78,
        moistureEmission: { value: 3.8, unit: 'lb/1000 ft²·24 h' },
        vocPlace: 'us-national',
        texture: { value: 22, unit: 'mil' },
      },
      loss: { percent: 6, convention: 'lost' },
      startsAt: '2026-12-14T13:00:00.000Z',
      timeZone: 'America/Chicago',
      bays: areas.map((area, index) => ({
        id: `bay-${index + 1}`,
        name: `${'ABC'[Math.floor(index / 3)] ?? ''}${(index % 3) + 1}`,
        area: { value: area, unit: 'ft²' as const },
        joints: [
          {
            length: { value: Math.round(area / 6.5), unit: 'ft' as const },
            width: { value: 0.1875, unit: 'in' as const },
            depth: { value: 2, unit: 'in' as const },
          },
        ],
        spalls: null,
      })),
    },
  },
  {
    buildUp: 'Urethane cement for hot wash-down, 6 mm',
    body: {
      name: 'Quillwater Bottling, wash bay',
      client: 'Quillwater Bottling',
      site: 'Wash bay behind the filling hall, Quillwater',
      status: 'open',
      conditions: {
        slabTemperature: { value: 16, unit: '°C' },
        airTemperature: { value: 18, unit: '°C' },
        relativeHumidity: 60,
        substrateRelativeHumidity: 90,
        moistureEmission: null,
        vocPlace: 'us-national',
        texture: null,
      },
      loss: { percent: 5, convention: 'added' },
      startsAt: null,
      timeZone: 'America/Chicago',
      bays: [
        { id: 'bay-1', name: 'Wash bay', area: { value: 62, unit: 'm²' }, joints: [], spalls: null },
        { id: 'bay-2', name: 'Drain run', area: { value: 9, unit: 'm²' }, joints: [], spalls: null },
      ],
    },
  },
]
