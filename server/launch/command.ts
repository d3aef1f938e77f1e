import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';

export type Finished = { code: number; output: string };

type CommandOptions = {
  /** 'show' lets the person see the output as it comes; 'keep' returns it */
  output?: 'show' | 'keep';
  cwd?: string;
  env?: NodeJS.ProcessEnv;
};

const running = new Set<ChildProcess>();

/** Runs a program to its end. The code is 127 where it cannot be started, 128 where a signal ended it. */
export function run(program: string, args: string[], options: CommandOptions = {}): Promise<Finished> {
  const { output = 'keep', cwd = '/', env = process.env } = options;
  const child = spawn(program, args, { cwd, env, stdio: output === 'show' ? 'inherit' : ['ignore', 'pipe', 'pipe'] });
  running.add(child);
  let text = '';
  for (const stream of [child.stdout, child.stderr]) stream?.on('data', (part) => (text += String(part)));
  return new Promise((resolve) => {
    const finish = (code: number) => {
      running.delete(child);
      resolve({ code, output: text.trim() });
    };
    child.once('error', (error) => {
      text += error.message;
      finish(127);
    });
    child.once('close', (code) => finish(code ?? 128));
  });
}

/** Ends what is still being run for us, so that a stop in the middle of a start leaves nothing behind. */
export function stopCommands(): void {
  for (const child of running) child.kill('SIGTERM');
}
