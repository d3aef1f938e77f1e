import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Section } from '#src/components/page.tsx';
import { useReplica } from '#src/replica/hooks.tsx';

/** The way out; while something is held it says so first, and leaves the choice. */
export function SignOut() {
  const replica = useReplica();
  const navigate = useNavigate();
  const [refusal, setRefusal] = useState<string | null>(null);
  const leaving = useMutation({
    mutationFn: (evenWithHeldOps: boolean) => replica.session.signOut({ evenWithHeldOps }),
    networkMode: 'always',
    retry: false,
    onSuccess(result) {
      if ('refused' in result) setRefusal(result.refused);
      else void navigate('/sign-in');
    },
  });
  return (
    <Section title="Leave">
      <div className="grid gap-3 px-4 pb-6 md:px-6">
        {leaving.error && <Notice tone="error">{leaving.error.message}</Notice>}
        {refusal !== null && (
          <Notice
            tone="warn"
            action={
              <Key disabled={leaving.isPending} onClick={() => leaving.mutate(true)}>
                Sign out, leave it here
              </Key>
            }
          >
            {refusal}
          </Notice>
        )}
        <Key disabled={leaving.isPending} onClick={() => leaving.mutate(false)}>
          Sign out
        </Key>
      </div>
    </Section>
  );
}
