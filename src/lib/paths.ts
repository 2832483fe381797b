/** Addresses of the pages. One place, so that a link and its route cannot drift apart. */
export const paths = {
  home: '/',
  signIn: '/sign-in',
  password: '/password',
  products: '/products',
  product: (id: string) => `/products/${id}`,
  newProduct: '/products/new',
  mixes: '/mixes',
  mix: (id: string) => `/mixes/${id}`,
  newMix: '/mixes/new',
  sheets: '/sheets',
  sheet: (id: string) => `/sheets/${id}`,
  /** The viewer: a page of a revision, with a box drawn (`left,top,right,bottom` in points). */
  sheetPage: (revisionId: string, page = 1, box?: readonly number[] | null) =>
    `/sheets/pages/${revisionId}?page=${page}${box ? `&box=${box.map((edge) => Math.round(edge * 10) / 10).join(',')}` : ''}`,
  buildUps: '/build-ups',
  /** The builder on one version; without a version the newest. */
  buildUp: (id: string, version?: number) => `/build-ups/${id}${version === undefined ? '' : `?version=${version}`}`,
  jobs: '/jobs',
  job: (id: string) => `/jobs/${id}`,
  newJob: '/jobs/new',
  specification: (id: string) => `/specifications/${id}`,
  issue: (id: string, issueNumber: number) => `/specifications/${id}/issues/${issueNumber}`,
  siteCards: '/site-cards',
  siteCard: (jobId: string) => `/site-cards/${jobId}`,
  people: '/people',
  firm: '/firm',
  outbox: '/outbox',
  changes: '/changes',
  account: '/account',
} as const
