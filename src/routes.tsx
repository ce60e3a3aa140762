import type { RouteObject } from 'react-router-dom'
import { AroundAll } from './components/frame/around-all.tsx'
import { FirstPage } from './components/frame/first-page.tsx'
import { NoSuchPage, PageFailed } from './components/frame/page-failed.tsx'
import { SignedInFrame } from './components/frame/signed-in-frame.tsx'

/** Before the first page's code is there. */
const NothingYet = () => null

/** Every page, each with code of its own that is fetched when it is opened. */
export const routes: RouteObject[] = [
  {
    Component: AroundAll,
    HydrateFallback: NothingYet,
    errorElement: <PageFailed />,
    children: [
      { path: '/sign-in', lazy: () => import('./pages/sign-in/sign-in-page.tsx').then(({ SignInPage: Component }) => ({ Component })) },
      { path: '/forgotten', lazy: () => import('./pages/sign-in/forgotten-page.tsx').then(({ ForgottenPage: Component }) => ({ Component })) },
      { path: '/links/:token', lazy: () => import('./pages/sign-in/link-page.tsx').then(({ LinkPage: Component }) => ({ Component })) },
      { path: '/check', lazy: () => import('./pages/check/check-page.tsx').then(({ CheckPage: Component }) => ({ Component })) },
      {
        Component: SignedInFrame,
        children: [
          { path: '/', Component: FirstPage },
          { path: '/jobs', lazy: () => import('./pages/jobs/jobs-page.tsx').then(({ JobsPage: Component }) => ({ Component })) },
          { path: '/jobs/:jobId', lazy: () => import('./pages/jobs/job-page.tsx').then(({ JobPage: Component }) => ({ Component })) },
          { path: '/jobs/:jobId/order', lazy: () => import('./pages/jobs/order-page.tsx').then(({ OrderPage: Component }) => ({ Component })) },
          { path: '/jobs/:jobId/labels', lazy: () => import('./pages/jobs/labels-page.tsx').then(({ LabelsPage: Component }) => ({ Component })) },
          { path: '/jobs/:jobId/packing-slip', lazy: () => import('./pages/jobs/packing-slip-page.tsx').then(({ PackingSlipPage: Component }) => ({ Component })) },
          { path: '/samples', lazy: () => import('./pages/samples/samples-page.tsx').then(({ SamplesPage: Component }) => ({ Component })) },
          { path: '/samples/:sampleId', lazy: () => import('./pages/samples/sample-page.tsx').then(({ SamplePage: Component }) => ({ Component })) },
          { path: '/bench', lazy: () => import('./pages/bench/benches-page.tsx').then(({ BenchesPage: Component }) => ({ Component })) },
          { path: '/bench/:benchId', lazy: () => import('./pages/bench/bench-page.tsx').then(({ BenchPage: Component }) => ({ Component })) },
          { path: '/receive', lazy: () => import('./pages/receive/receive-page.tsx').then(({ ReceivePage: Component }) => ({ Component })) },
          { path: '/review', lazy: () => import('./pages/review/review-page.tsx').then(({ ReviewPage: Component }) => ({ Component })) },
          { path: '/floor', lazy: () => import('./pages/floor/floor-page.tsx').then(({ FloorPage: Component }) => ({ Component })) },
          { path: '/people', lazy: () => import('./pages/people/people-page.tsx').then(({ PeoplePage: Component }) => ({ Component })) },
          { path: '/me', lazy: () => import('./pages/people/me-page.tsx').then(({ MePage: Component }) => ({ Component })) },
          { path: '/equipment', lazy: () => import('./pages/equipment/equipment-page.tsx').then(({ EquipmentPage: Component }) => ({ Component })) },
          { path: '/reports', lazy: () => import('./pages/reports/reports-page.tsx').then(({ ReportsPage: Component }) => ({ Component })) },
          { path: '/invoices', lazy: () => import('./pages/invoices/invoices-page.tsx').then(({ InvoicesPage: Component }) => ({ Component })) },
          { path: '/invoices/:invoiceId', lazy: () => import('./pages/invoices/invoice-page.tsx').then(({ InvoicePage: Component }) => ({ Component })) },
          { path: '*', Component: NoSuchPage },
        ],
      },
    ],
  },
]
