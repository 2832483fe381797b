import type { Job, JobBody } from '../../../shared/api/jobs.ts'

/** What of a job a person edits. */
export function bodyOf(job: Job): JobBody {
  const { name, client, site, status, conditions, loss, startsAt, timeZone, bays, crew, buildUp } = job
  return {
    name,
    client,
    site,
    status,
    conditions,
    loss,
    startsAt,
    timeZone,
    bays,
    crewIds: crew.map(({ id }) => id),
    buildUpVersionId: buildUp?.versionId ?? null,
  }
}

/** A job before anything is known of it. The conditions are a heated hall, to be replaced by what is measured. */
export function emptyBody(): JobBody {
  return {
    name: '',
    client: '',
    site: '',
    status: 'open',
    buildUpVersionId: null,
    conditions: {
      slabTemperature: { value: 68, unit: '°F' },
      airTemperature: { value: 68, unit: '°F' },
      relativeHumidity: 45,
      substrateRelativeHumidity: null,
      moistureEmission: null,
      vocPlace: null,
      texture: null,
    },
    loss: { percent: 5, convention: 'lost' },
    startsAt: null,
    timeZone: Intl.DateTimeFormat().resolvedOptions().timeZone,
    bays: [],
    crewIds: [],
  }
}

/** An id for a bay, unlike those it stands among. */
export function freshBayId(bays: JobBody['bays']): string {
  const taken = new Set(bays.map(({ id }) => id))
  let count = bays.length + 1
  while (taken.has(`bay-${count}`)) count += 1
  return `bay-${count}`
}
