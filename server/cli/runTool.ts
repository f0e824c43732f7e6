/** Runs another program to its end; the one place where the command line starts short-lived tools. */
import { spawn } from 'node:child_process';

/** Prints one line of progress. */
export type Say = (line: string) => void;

export type ToolUser = { uid: number; gid: number };

export type ToolRun = {
  cwd?: string;
  env?: NodeJS.ProcessEnv;
  /** Runs the program as this user; only root may ask for it. */
  user?: ToolUser | undefined;
  /** 'show' lets the program write to this terminal; 'keep' (the default) collects its output. */
  output?: 'keep' | 'show';
  /** Ends the program when aborted. */
  signal?: AbortSignal | undefined;
};

export type ToolResult = { code: number; output: string };

/** Runs `command` and resolves with its exit code and collected output (standard output, then errors, as they came). */
export function tryTool(command: string, args: readonly string[], run: ToolRun = {}): Promise<ToolResult> {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      ...(run.cwd === undefined ? {} : { cwd: run.cwd }),
      ...(run.env === undefined ? {} : { env: run.env }),
      ...(run.user === undefined ? {} : { uid: run.user.uid, gid: run.user.gid }),
      ...(run.signal === undefined ? {} : { signal: run.signal }),
      stdio: run.output === 'show' ? ['ignore', 'inherit', 'inherit'] : ['ignore', 'pipe', 'pipe'],
    });
    const chunks: Buffer[] = [];
    child.stdout?.on('data', (chunk: Buffer) => chunks.push(chunk));
    child.stderr?.on('data', (chunk: Buffer) => chunks.push(chunk));
    child.on('error', (error) => reject(new Error(`${command} could not be run: ${error.message}`)));
    child.on('close', (code, signal) => {
      resolve({ code: code ?? (signal === null ? 1 : 128), output: Buffer.concat(chunks).toString('utf8') });
    });
  });
}

/** Like {@link tryTool}, but throws with the program's last lines when it fails. */
export async function runTool(command: string, args: readonly string[], run: ToolRun = {}): Promise<string> {
  const { code, output } = await tryTool(command, args, run);
  if (code !== 0) {
    throw new Error(`${command} ended with code ${String(code)}:\n${lastLines(output, 12)}`);
  }
  return output;
}

/** The last `count` lines of a text, without trailing blank lines. */
export function lastLines(text: string, count: number): string {
  return text.trimEnd().split('\n').slice(-count).join('\n');
}
