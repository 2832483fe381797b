import { createBrowserRouter, type RouteObject } from 'react-router'
import { ErrorPage, NothingHere } from './error-page.tsx'
import { Shell } from './shell.tsx'

/** A page is loaded when it is first gone to; its module names the component. */
function page<M>(path: string, load: () => Promise<M>, pick: (module: M) => React.ComponentType): RouteObject {
  return { path, lazy: async () => ({ Component: pick(await load()) }), errorElement: <ErrorPage /> }
}

const signedIn: RouteObject[] = [
  page(
    '/',
    () => import('./home.tsx'),
    (module) => module.Home,
  ),
  page(
    '/products',
    () => import('../features/catalogue/products-page.tsx'),
    (module) => module.ProductsPage,
  ),
  page(
    '/products/new',
    () => import('../features/catalogue/product-form-page.tsx'),
    (module) => module.NewProductPage,
  ),
  page(
    '/products/:productId',
    () => import('../features/catalogue/record-page.tsx'),
    (module) => module.ProductPage,
  ),
  page(
    '/products/:productId/edit',
    () => import('../features/catalogue/product-form-page.tsx'),
    (module) => module.EditProductPage,
  ),
  page(
    '/products/:productId/values/new',
    () => import('../features/catalogue/value-page.tsx'),
    (module) => module.ProductValuePage,
  ),
  page(
    '/products/:productId/values/:factId',
    () => import('../features/catalogue/value-page.tsx'),
    (module) => module.ProductValuePage,
  ),
  page(
    '/mixes',
    () => import('../features/catalogue/mixes-page.tsx'),
    (module) => module.MixesPage,
  ),
  page(
    '/mixes/new',
    () => import('../features/catalogue/mix-form-page.tsx'),
    (module) => module.NewMixPage,
  ),
  page(
    '/mixes/:mixId',
    () => import('../features/catalogue/record-page.tsx'),
    (module) => module.MixPage,
  ),
  page(
    '/mixes/:mixId/edit',
    () => import('../features/catalogue/mix-form-page.tsx'),
    (module) => module.EditMixPage,
  ),
  page(
    '/mixes/:mixId/values/new',
    () => import('../features/catalogue/value-page.tsx'),
    (module) => module.MixValuePage,
  ),
  page(
    '/mixes/:mixId/values/:factId',
    () => import('../features/catalogue/value-page.tsx'),
    (module) => module.MixValuePage,
  ),
  page(
    '/jobs',
    () => import('../features/jobs/jobs-page.tsx'),
    (module) => module.JobsPage,
  ),
  page(
    '/jobs/new',
    () => import('../features/jobs/job-page.tsx'),
    (module) => module.NewJobPage,
  ),
  page(
    '/jobs/:jobId',
    () => import('../features/jobs/job-page.tsx'),
    (module) => module.JobPage,
  ),
  page(
    '/site-cards',
    () => import('../features/site-cards/site-cards-page.tsx'),
    (module) => module.SiteCardsPage,
  ),
  page(
    '/site-cards/:jobId',
    () => import('../features/site-cards/site-card-page.tsx'),
    (module) => module.SiteCardPage,
  ),
  page(
    '/build-ups',
    () => import('../features/build-ups/build-ups-page.tsx'),
    (module) => module.BuildUpsPage,
  ),
  page(
    '/build-ups/:buildUpId',
    () => import('../features/build-ups/builder-page.tsx'),
    (module) => module.BuilderPage,
  ),
  page(
    '/sheets',
    () => import('../features/sheets/sheets-page.tsx'),
    (module) => module.SheetsPage,
  ),
  page(
    '/sheets/:sheetId',
    () => import('../features/sheets/sheet-page.tsx'),
    (module) => module.SheetPage,
  ),
  page(
    '/sheets/pages/:revisionId',
    () => import('../features/sheets/page-view-page.tsx'),
    (module) => module.PageViewPage,
  ),
  page(
    '/specifications/:specificationId',
    () => import('../features/specifications/specification-page.tsx'),
    (module) => module.SpecificationPage,
  ),
  page(
    '/specifications/:specificationId/issues/:number',
    () => import('../features/specifications/specification-page.tsx'),
    (module) => module.IssuePage,
  ),
  page(
    '/people',
    () => import('../features/people/people-page.tsx'),
    (module) => module.PeoplePage,
  ),
  page(
    '/firm',
    () => import('../features/people/firm-page.tsx'),
    (module) => module.FirmPage,
  ),
  page(
    '/outbox',
    () => import('../features/people/outbox-page.tsx'),
    (module) => module.OutboxPage,
  ),
  page(
    '/changes',
    () => import('../features/people/changes-page.tsx'),
    (module) => module.ChangesPage,
  ),
  page(
    '/account',
    () => import('../features/people/account-page.tsx'),
    (module) => module.AccountPage,
  ),
]

export function createRouter() {
  return createBrowserRouter([
    page(
      '/sign-in',
      () => import('../features/people/sign-in-page.tsx'),
      (module) => module.SignInPage,
    ),
    page(
      '/password',
      () => import('../features/people/password-page.tsx'),
      (module) => module.PasswordPage,
    ),
    {
      element: <Shell />,
      errorElement: <ErrorPage />,
      hydrateFallbackElement: <></>,
      children: [...signedIn, { path: '*', element: <NothingHere /> }],
    },
  ])
}
