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
              { path: paths.more, lazy: () => import('./layouts/more') },
              { path: paths.account, lazy: () => import('../routes/account') },
              { path: paths.people, lazy: () => import('../routes/people') },
              { path: paths.shopSettings, lazy: () => import('../routes/shop-settings') },
              { path: '*', Component: NotFoundPage },
            ],
          },
        ],
      },
    ],
  },
];

export const router = createBrowserRouter(routes);
