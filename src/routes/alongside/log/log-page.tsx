import { useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { daySchema } from '#shared/sync/day.ts';
import { BackBar } from '#src/components/back-bar.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Page } from '#src/components/page.tsx';
import { EntryForm } from '#src/routes/alongside/log/entry-form.tsx';
import type { LogFor } from '#src/routes/alongside/log/use-entry-form.ts';
import { useWhere } from '#src/routes/alongside/use-where.ts';

/** The form for a new entry; `?for=<person>&day=<day>` opens it for somebody who has not logged that day. */
export default function LogPage() {
  const [where, choose] = useWhere();
  const navigate = useNavigate();
  const logFor = readLogFor(useSearchParams()[0]);
  // the form keeps the place that it was opened at, or that its draft has, whatever is remembered meanwhile
  const [openedAt] = useState(where);
  if (!openedAt) {
    return (
      <Page
        bars={
          <>
            <title>Log it · Ribband</title>
            <BackBar title="Log it" to="/alongside" backWord="Back to Alongside" />
          </>
        }
      >
        <Empty>No boat is here yet to log on.</Empty>
      </Page>
    );
  }
  return (
    <EntryForm
      key={logFor ? `${logFor.personId} ${logFor.day}` : ''}
      where={openedAt}
      logFor={logFor}
      onMove={choose}
      onLogged={(done) => void navigate(logFor ? `/day/${logFor.day}` : '/alongside', { state: done })}
    />
  );
}

function readLogFor(search: URLSearchParams): LogFor | null {
  const [personId, day] = [search.get('for'), daySchema.safeParse(search.get('day'))];
  return personId && day.success ? { personId, day: day.data } : null;
}
