import { Icon } from '#src/components/icons.tsx';

/** How everything that is typed into looks: 18 px, so that no phone zooms in on it. */
export const FIELD_LOOK =
  'block w-full min-h-key rounded-key border-2 border-bilge bg-plank px-3 text-[18px] leading-snug text-bilge placeholder:text-slate aria-invalid:border-[3px] aria-invalid:border-redlead disabled:border-dashed disabled:border-slate';

interface FieldProblemProps {
  id: string;
  problem: string | undefined;
}

/** What is wrong with a field and what to do, told by a sign and words; read out when it comes. */
export function FieldProblem({ id, problem }: FieldProblemProps) {
  return (
    <div id={id} aria-live="polite">
      {problem !== undefined && (
        <p className="flex items-start gap-2 font-semibold text-redlead">
          <Icon name="warning" className="mt-[1px]" />
          {problem}
        </p>
      )}
    </div>
  );
}
