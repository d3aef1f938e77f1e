import { Navigate, useParams } from 'react-router-dom';
import { daySchema, type Day } from '#shared/sync/day.ts';
import { Notice } from '#src/components/notice.tsx';
import { useMe, useRead } from '#src/replica/hooks.tsx';
import { DeedBar } from '#src/shell/deed-bar.tsx';
import { PlacePage } from '#src/shell/place-page.tsx';
import { useDeeds } from '#src/shell/use-deeds.ts';
import { BoardHead } from './board-head.tsx';
import { OwnPlan } from './own-plan.tsx';
import { PersonColumn } from './person-column.tsx';
import { dayToPlan, readBoard } from './read-board.ts';

/** Tomorrow: for foreman and office what each person has, for the crew what is theirs. */
export default function PlanPage() {
  const { date } = useParams();
  const me = useMe();
  const next = useRead(['day-to-plan'], dayToPlan);
  const readsAll = me?.roles.some((role) => role === 'foreman' || role === 'office') ?? false;
  if (!readsAll)
    return (
      <PlacePage title="Your plan">
        <OwnPlan />
      </PlacePage>
    );
  if (date !== undefined && !daySchema.safeParse(date).success) return <Navigate to="/plan" replace />;
  return <PlanBoard day={date ?? next} />;
}

function PlanBoard({ day }: { day: Day }) {
  const board = useRead(['board', day], (view) => readBoard(view, day));
  const deeds = useDeeds();
  return (
    <PlacePage title="Plan" width="wide" foot={<DeedBar deeds={deeds} />}>
      <div className="pb-8 md:px-6">
        <BoardHead board={board} />
        {deeds.failure && <Notice tone="error">{deeds.failure}</Notice>}
        {board.people.length === 0 ? (
          <p className="px-4 text-slate md:px-0">Nobody of the crew is here yet.</p>
        ) : (
          <ul className="grid grid-cols-[minmax(0,1fr)] gap-seam py-seam md:grid-cols-[repeat(auto-fit,minmax(232px,1fr))] md:px-seam">
            {board.people.map((person) => (
              <PersonColumn key={person.personId} board={board} person={person} deeds={deeds} />
            ))}
          </ul>
        )}
      </div>
    </PlacePage>
  );
}
