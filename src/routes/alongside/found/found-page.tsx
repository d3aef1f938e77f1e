import { useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { BackBar } from '#src/components/back-bar.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Page } from '#src/components/page.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { FoundForm } from '#src/routes/alongside/found/found-form.tsx';
import { useWhere } from '#src/routes/alongside/use-where.ts';

/** The form for a finding; `?entry=<id>` has it come with an entry. */
export default function FoundPage() {
  const [where, choose] = useWhere();
  const navigate = useNavigate();
  const asked = useSearchParams()[0].get('entry');
  const entry = useRead(['found entry', asked], (view) => {
    const row = asked === null ? undefined : view.find('entry', asked);
    return row ? { id: row.id, where: { boatId: row.boatId, stageId: row.stageId } } : null;
  });
  // the form keeps the place that it was opened at
  const [openedAt] = useState(entry?.where ?? where);
  if (!openedAt) {
    return (
      <Page
        bars={
          <>
            <title>Found · Ribband</title>
            <BackBar title="Found" to="/alongside" backWord="Back to Alongside" />
          </>
        }
      >
        <Empty>No boat is here yet to find anything on.</Empty>
      </Page>
    );
  }
  return (
    <FoundForm
      where={openedAt}
      entryId={entry?.id ?? null}
      onMove={choose}
      onLogged={(done) => void navigate(entry ? `/entry/${entry.id}` : '/alongside', { state: done })}
    />
  );
}
