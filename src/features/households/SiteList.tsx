import { useState } from 'react';
import type { Site } from '#shared/api/households.ts';
import { useRemoveSite } from '#src/api/households.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { Chip } from '#src/components/Chip.tsx';
import { ConfirmDialog } from '#src/components/ConfirmDialog.tsx';
import { toast } from '#src/components/toast.ts';
import { writeCount } from '#src/lib/words.ts';

/** Every site with who is at it; changed and, once empty, removed here. */
export function SiteList({
  sites,
  onChange,
}: {
  sites: readonly Site[];
  /** null: the person may only look. */
  onChange: ((site: Site) => void) | null;
}) {
  const [going, setGoing] = useState<Site | null>(null);
  return (
    <Card className="max-w-4xl">
      <ul className="rows">
        {sites.map((site) => (
          <li key={site.id} className="flex flex-wrap items-center justify-between gap-3 py-3">
            <div className="min-w-0">
              <p>
                <b>{site.name}</b>{' '}
                <span className="text-slate">{writeCount(site.householdCount, 'household')}</span>{' '}
                {site.hasGateCode && <Chip>gate code kept</Chip>}
              </p>
              <p className="whitespace-pre-line text-slate">
                {site.parkingNotes || 'Nothing noted about parking.'}
              </p>
            </div>
            {onChange && (
              <div className="flex gap-1">
                <Button size="small" onClick={() => onChange(site)}>
                  Change<span className="sr-only"> {site.name}</span>
                </Button>
                <Button size="small" kind="quiet" onClick={() => setGoing(site)}>
                  Remove<span className="sr-only"> {site.name}</span>
                </Button>
              </div>
            )}
          </li>
        ))}
      </ul>
      {going && <RemoveSite site={going} onClose={() => setGoing(null)} />}
    </Card>
  );
}

function RemoveSite({ site, onClose }: { site: Site; onClose: () => void }) {
  const remove = useRemoveSite();
  return (
    <ConfirmDialog
      title={`Remove ${site.name}?`}
      confirm="Remove the site"
      keep="Keep it"
      busy={remove.isPending}
      error={remove.error}
      onClose={onClose}
      onConfirm={() =>
        remove.mutate(
          { params: { siteId: site.id } },
          {
            onSuccess: () => {
              toast(`${site.name} is removed.`);
              onClose();
            },
          },
        )
      }
    >
      Its parking notes and gate code go with it. Households still at it need another site first.
    </ConfirmDialog>
  );
}
