import { createBrowserRouter, Navigate } from 'react-router';
import { SkeletonBlock } from '../components/skeletons';
import { paths } from '../lib/paths';
import { ErrorPage, NotFoundPage } from './error-page';
import { AuthLayout } from './layouts/auth-layout';
import { ShopLayout } from './layouts/shop-layout';

const PageLoading = () => <SkeletonBlock height="var(--pp-sizes-touch)" />;

export const routes = [
  {
    HydrateFallback: PageLoading,
    ErrorBoundary: ErrorPage,
    children: [
      {
        Component: AuthLayout,
        ErrorBoundary: ErrorPage,
        children: [
          { path: paths.signIn, lazy: () => import('../routes/sign-in') },
          { path: paths.signUp, lazy: () => import('../routes/sign-up') },
          { path: paths.acceptInvitation, lazy: () => import('../routes/accept-invitation') },
          { path: paths.forgotPassword, lazy: () => import('../routes/forgot-password') },
          { path: paths.resetPassword, lazy: () => import('../routes/reset-password') },
        ],
      },
      {
        Component: ShopLayout,
        ErrorBoundary: ErrorPage,
        children: [
          {
            ErrorBoundary: ErrorPage,
            children: [
              { path: paths.home, element: <Navigate to={paths.machine} replace /> },
              { path: paths.machine, lazy: () => import('../routes/at-the-machine') },
              { path: '/machine/sheet', lazy: () => import('../routes/set-up-sheet') },
              { path: paths.runs, lazy: () => import('../routes/runs') },
              { path: '/runs/start', lazy: () => import('../routes/run-start') },
              { path: '/runs/:code', lazy: () => import('../routes/run') },
              { path: '/runs/:code/part', lazy: () => import('../routes/part-sheet') },
              { path: paths.partSetUp, lazy: () => import('../routes/part-set-up') },
              { path: paths.requests, lazy: () => import('../routes/requests') },
              { path: paths.scienceIndex, lazy: () => import('../routes/science') },
              { path: '/science/:page', lazy: () => import('../routes/science') },
              { path: paths.more, lazy: () => import('./layouts/more') },
              { path: paths.account, lazy: () => import('../routes/account') },
              { path: paths.coupons, lazy: () => import('../routes/coupons') },
              { path: paths.planCoupon, lazy: () => import('../routes/coupon-plan') },
              { path: paths.importCoupon, lazy: () => import('../routes/coupon-import') },
              { path: '/coupons/:code', lazy: () => import('../routes/coupon') },
              { path: '/coupons/:code/mark', lazy: () => import('../routes/coupon-mark') },
              { path: paths.equipment, lazy: () => import('../routes/equipment') },
              { path: paths.newMachine, lazy: () => import('../routes/equipment-machine-new') },
              { path: '/equipment/machines/:machineId', lazy: () => import('../routes/equipment-machine') },
              { path: '/equipment/machines/:machineId/edit', lazy: () => import('../routes/equipment-machine-edit') },
              { path: paths.materials, lazy: () => import('../routes/materials') },
              { path: paths.newMaterial, lazy: () => import('../routes/material-new') },
              { path: paths.finishes, lazy: () => import('../routes/materials-finishes') },
              { path: paths.materialGroups, lazy: () => import('../routes/materials-groups') },
              { path: paths.effects, lazy: () => import('../routes/materials-effects') },
              { path: paths.cautions, lazy: () => import('../routes/materials-cautions') },
              { path: '/materials/:materialId', lazy: () => import('../routes/material') },
              { path: paths.people, lazy: () => import('../routes/people') },
              { path: '/people/:memberId', lazy: () => import('../routes/person') },
              { path: paths.ledger, lazy: () => import('../routes/ledger') },
              { path: paths.shopSettings, lazy: () => import('../routes/shop-settings') },
              { path: paths.recipes, lazy: () => import('../routes/recipes') },
              { path: paths.newRecipe, lazy: () => import('../routes/recipe-new') },
              { path: '/recipes/:code', lazy: () => import('../routes/recipe') },
              { path: '/recipes/:code/revisions/:revisionId', lazy: () => import('../routes/recipe-draft') },
              { path: '/recipes/:code/revisions/:revisionId/transfer', lazy: () => import('../routes/recipe-transfer') },
              { path: '/recipes/:code/transfer', lazy: () => import('../routes/recipe-transfer-current') },
              { path: '/recipes/:code/compare', lazy: () => import('../routes/compare') },
              { path: paths.signOffs, lazy: () => import('../routes/sign-off-queue') },
              { path: '/sign-off/:revisionId', lazy: () => import('../routes/sign-off') },
              { path: '*', Component: NotFoundPage },
            ],
          },
        ],
      },
    ],
  },
];

export const router = createBrowserRouter(routes);
