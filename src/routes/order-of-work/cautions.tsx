import { useQuery } from '@tanstack/react-query';
import { taskTemplate } from '#shared/trade/task-template.ts';
import { Icon } from '#src/components/icons.tsx';

/** The short cautions of a task that came from a template; each says who decides. Nothing for a task of the shop's own. */
export function Cautions({ templateId }: { templateId: string | undefined }) {
  const { data } = useQuery({
    queryKey: ['task-template', templateId],
    queryFn: async () => (templateId && (await taskTemplate(templateId))) || null,
    networkMode: 'always',
    staleTime: Infinity,
  });
  if (!data || data.cautions.length === 0) return null;
  return (
    <section
      aria-label="Cautions"
      className="grid gap-3 border-2 border-l-[9px] border-on-seam bg-seam p-3 text-on-seam"
    >
      {data.cautions.map(({ id, brief, text }) => (
        <details key={id}>
          <summary className="flex min-h-key cursor-pointer items-center gap-2 leading-snug font-semibold">
            <Icon name="warning" />
            {brief}
          </summary>
          <p className="pb-1 pl-8">{text}</p>
          <p className="pb-1 pl-8">{data.safetyNote}</p>
        </details>
      ))}
    </section>
  );
}
