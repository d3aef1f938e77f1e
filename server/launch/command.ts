import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';

export type Finished = { code: number; output: string };

export type CommandOptions = {
  /** 'show' lets the person see the output as it comes; 'keep' returns it */
  output?: 'show' | 'keep';
  cwd?: string;
  env?: NodeJS.ProcessEnv;
  /** a stop of ours waits for it instead of ending it */
  isLeftToFinish?: boolean;
  /** it belongs to a stop, after which nothing else is begun */
  isPartOfStop?: boolean;
};

type Running = { child: ChildProcess; finished: Promise<Finished>; isLeftToFinish: boolean };

const SIGNALLED = 128;
const running = new Set<Running>();
let isStopping = false;

/** Runs a program to its end. The code is 127 where it cannot be started, 128 where a signal or a stop ended it. */
export async function run(program: string, args: string[], options: CommandOptions = {}): Promise<Finished> {
  const {
    output = 'keep',
    cwd = '/',
    env = process.env,
    isLeftToFinish = false,
    isPartOfStop = false,
  } = options;
  if (isStopping && !isPartOfStop) return { code: SIGNALLED, output: 'stopped' };
  const child = spawn(program, args, {
    cwd,
    env,
    stdio: output === 'show' ? 'inherit' : ['ignore', 'pipe', 'pipe'],
  });
  const command = { child, finished: untilClosed(child), isLeftToFinish };
  running.add(command);
  return command.finished.finally(() => running.delete(command));
}

function untilClosed(child: ChildProcess): Promise<Finished> {
  let text = '';
  for (const stream of [child.stdout, child.stderr]) stream?.on('data', (part) => (text += String(part)));
  return new Promise((resolve) => {
    const finish = (code: number) => resolve({ code, output: text.trim() });
    child.once('error', (error) => {
      text += error.message;
      finish(127);
    });
    child.once('close', (code) => finish(code ?? SIGNALLED));
  });
}

/** Ends what is still being run for us and begins nothing more, so that a stop in the middle of a start leaves nothing behind. */
export async function stopCommands(): Promise<void> {
  isStopping = true;
  const left = [...running];
  for (const { child, isLeftToFinish } of left) if (!isLeftToFinish) child.kill('SIGTERM');
  await Promise.all(left.map(({ finished }) => finished));
}
