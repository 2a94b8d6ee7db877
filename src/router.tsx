import { createBrowserRouter, redirect, type RouteObject } from 'react-router-dom';
import { loadSession } from './api/loadSession.ts';
import { readSession } from './api/sessionStore.ts';
import { AppShell } from './routes/AppShell.tsx';
import { BrokenScreen } from './routes/BrokenScreen.tsx';
import { DoorShell } from './routes/DoorShell.tsx';
import { HomeScreen } from './routes/HomeScreen.tsx';
import { NotFoundScreen } from './routes/NotFoundScreen.tsx';
import { OpeningScreen } from './routes/OpeningScreen.tsx';

/** Every screen's address. Each screen is its own chunk, so a phone loads the run and little else. */
export const routes: RouteObject[] = [
  {
    id: 'root',
    loader: async () => (await readOrLoadSession()) !== null,
    // Asked once when the page opens; later changes of the sign-in come from the store.
    shouldRevalidate: () => false,
    HydrateFallback: OpeningScreen,
    ErrorBoundary: BrokenScreen,
    children: [
      {
        Component: DoorShell,
        ErrorBoundary: BrokenScreen,
        children: [
          {
            path: '/sign-in',
            lazy: () => screen(import('./routes/SignInScreen.tsx'), 'SignInScreen'),
          },
          {
            path: '/sign-up',
            lazy: () => screen(import('./routes/SignUpScreen.tsx'), 'SignUpScreen'),
          },
          {
            path: '/reset',
            lazy: () => screen(import('./routes/ForgottenScreen.tsx'), 'ForgottenScreen'),
          },
          {
            path: '/reset/:token',
            lazy: () => screen(import('./routes/NewPasswordScreen.tsx'), 'NewPasswordScreen'),
          },
          {
            path: '/join/:token',
            lazy: () => screen(import('./routes/InvitationScreen.tsx'), 'InvitationScreen'),
          },
        ],
      },
      {
        path: '/fakes/phones',
        ErrorBoundary: BrokenScreen,
        lazy: () => screen(import('./routes/FakePhonesScreen.tsx'), 'FakePhonesScreen'),
      },
      {
        path: '/fakes/letters',
        ErrorBoundary: BrokenScreen,
        lazy: () => screen(import('./routes/FakeLettersScreen.tsx'), 'FakeLettersScreen'),
      },
      {
        Component: AppShell,
        ErrorBoundary: BrokenScreen,
        children: [
          { path: '/', Component: HomeScreen },
          {
            path: '/day/:date?',
            lazy: () => screen(import('./routes/DayScreen.tsx'), 'DayScreen'),
          },
          {
            path: '/run',
            lazy: () => screen(import('./routes/RunListScreen.tsx'), 'RunListScreen'),
          },
          {
            path: '/run/:runId',
            lazy: () => screen(import('./routes/RunScreen.tsx'), 'RunScreen'),
          },
          {
            path: '/households',
            lazy: () => screen(import('./routes/HouseholdsScreen.tsx'), 'HouseholdsScreen'),
          },
          {
            path: '/households/sites',
            lazy: () => screen(import('./routes/SitesScreen.tsx'), 'SitesScreen'),
          },
          {
            path: '/households/new',
            lazy: () => screen(import('./routes/HouseholdFormScreen.tsx'), 'HouseholdFormScreen'),
          },
          {
            path: '/households/:householdId',
            lazy: () => screen(import('./routes/HouseholdScreen.tsx'), 'HouseholdScreen'),
          },
          {
            path: '/households/:householdId/edit',
            lazy: () => screen(import('./routes/HouseholdFormScreen.tsx'), 'HouseholdFormScreen'),
          },
          {
            path: '/households/:householdId/pets/new',
            lazy: () => screen(import('./routes/PetFormScreen.tsx'), 'PetFormScreen'),
          },
          {
            path: '/households/:householdId/pets/:petId',
            lazy: () => screen(import('./routes/PetScreen.tsx'), 'PetScreen'),
          },
          {
            path: '/households/:householdId/pets/:petId/edit',
            lazy: () => screen(import('./routes/PetFormScreen.tsx'), 'PetFormScreen'),
          },
          {
            path: '/households/:householdId/pets/:petId/style',
            lazy: () => screen(import('./routes/PetStyleScreen.tsx'), 'PetStyleScreen'),
          },
          {
            path: '/forecast',
            lazy: () => screen(import('./routes/ForecastScreen.tsx'), 'ForecastScreen'),
          },
          { path: '/texts', lazy: () => screen(import('./routes/TextsScreen.tsx'), 'TextsScreen') },
          {
            path: '/review',
            lazy: () => screen(import('./routes/ReviewScreen.tsx'), 'ReviewScreen'),
          },
          { path: '/setup', loader: () => redirect('/setup/business') },
          {
            path: '/setup/:tab',
            lazy: () => screen(import('./routes/SetupScreen.tsx'), 'SetupScreen'),
          },
          { path: '*', Component: NotFoundScreen },
        ],
      },
    ],
  },
];

export function makeRouter() {
  return createBrowserRouter(routes);
}

async function readOrLoadSession() {
  return readSession() ?? (await loadSession());
}

async function screen<Name extends string>(
  file: Promise<Record<Name, React.ComponentType>>,
  name: Name,
): Promise<{ Component: React.ComponentType }> {
  return { Component: (await file)[name] };
}
