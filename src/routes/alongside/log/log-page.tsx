import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { BackBar } from '#src/components/back-bar.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Page } from '#src/components/page.tsx';
import { EntryForm } from '#src/routes/alongside/log/entry-form.tsx';
import { useWhere } from '#src/routes/alongside/use-where.ts';

/** The form for a new entry. */
export default function LogPage() {
  const [where, choose] = useWhere();
  const navigate = useNavigate();
  // the form keeps the place that it was opened at, or that its draft has, whatever is remembered meanwhile
  const [openedAt] = useState(where);
  if (!openedAt) {
    return (
      <Page bars={<BackBar title="Log it" to="/alongside" backWord="Back to Alongside" />}>
        <Empty>No boat is here yet to log on.</Empty>
      </Page>
    );
  }
  return (
    <EntryForm
      where={openedAt}
      onMove={choose}
      onLogged={(logged) => void navigate('/alongside', { state: logged })}
    />
  );
}
