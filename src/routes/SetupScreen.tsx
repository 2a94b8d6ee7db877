import { lazy, Suspense, type ComponentType } from 'react';
import { useParams } from 'react-router-dom';
import { useCan, useSession } from '#src/api/sessionStore.ts';
import { Loading } from '#src/components/Loading.tsx';
import { NextSetupStep } from '#src/features/setup/SetupGuide.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { TabLinks } from '#src/components/TabLinks.tsx';
import { NotFoundScreen } from './NotFoundScreen.tsx';

const tabs: { key: string; words: string; Panel: ComponentType }[] = [
  {
    key: 'business',
    words: 'Business',
    Panel: lazy(async () => ({
      default: (await import('#src/features/setup/BusinessPanel.tsx')).BusinessPanel,
    })),
  },
  {
    key: 'area',
    words: 'Area',
    Panel: lazy(async () => ({
      default: (await import('#src/features/setup/AreaPanel.tsx')).AreaPanel,
    })),
  },
  {
    key: 'places',
    words: 'Places',
    Panel: lazy(async () => ({
      default: (await import('#src/features/setup/PlacesPanel.tsx')).PlacesPanel,
    })),
  },
  {
    key: 'vans',
    words: 'Vans',
    Panel: lazy(async () => ({
      default: (await import('#src/features/setup/VansPanel.tsx')).VansPanel,
    })),
  },
  {
    key: 'groomers',
    words: 'Groomers',
    Panel: lazy(async () => ({
      default: (await import('#src/features/setup/GroomersPanel.tsx')).GroomersPanel,
    })),
  },
  {
    key: 'shifts',
    words: 'Shifts',
    Panel: lazy(async () => ({
      default: (await import('#src/features/setup/ShiftsPanel.tsx')).ShiftsPanel,
    })),
  },
  {
    key: 'styles',
    words: 'Styles',
    Panel: lazy(async () => ({
      default: (await import('#src/features/styles/StylesPanel.tsx')).StylesPanel,
    })),
  },
  {
    key: 'people',
    words: 'People',
    Panel: lazy(async () => ({
      default: (await import('#src/features/setup/PeoplePanel.tsx')).PeoplePanel,
    })),
  },
];

/** What the days are made from: business, area, places, vans, groomers, shifts, styles, people. */
export function SetupScreen() {
  const { tab } = useParams();
  const { business } = useSession();
  const seesPeople = useCan('members.edit');
  const shown = tabs.filter(({ key }) => key !== 'people' || seesPeople);
  const current = shown.find(({ key }) => key === tab);
  if (!current) return <NotFoundScreen />;
  return (
    <>
      <PageHeader title="Setup" dim={business.name} />
      <NextSetupStep at={`/setup/${current.key}`} />
      <TabLinks
        label="Setup"
        tabs={shown.map(({ key, words }) => ({ to: `/setup/${key}`, words }))}
      />
      <div className="pt-5">
        <Suspense fallback={<Loading />}>
          <current.Panel />
        </Suspense>
      </div>
    </>
  );
}
