import { buildUpEndpoints } from './build-ups.ts'
import { catalogueEndpoints } from './catalogue.ts'
import type { Endpoint } from './endpoint.ts'
import { healthEndpoints } from './health.ts'
import { jobEndpoints } from './jobs.ts'
import { peopleEndpoints } from './people.ts'
import { sessionEndpoints } from './session.ts'
import { sheetEndpoints } from './sheets.ts'
import { siteCardEndpoints } from './site-cards.ts'
import { specificationEndpoints } from './specifications.ts'

/** Every endpoint by name: the source of the OpenAPI document and of the tests that walk it. */
export const endpoints: Record<string, Endpoint> = {
  ...healthEndpoints,
  ...sessionEndpoints,
  ...peopleEndpoints,
  ...catalogueEndpoints,
  ...buildUpEndpoints,
  ...jobEndpoints,
  ...siteCardEndpoints,
  ...sheetEndpoints,
  ...specificationEndpoints,
}
