import { describe, expect, it } from 'vitest';

import { sourceFiles } from './sourceFiles';

// Put together from pieces, so that this file passes its own check.
const joined = (...pieces: string[]) => pieces.join('');
const anyOf = (...words: string[]) => words.join('|');

const machinePath = new RegExp(`(?<![\\w.)}\`])/(${anyOf(joined('wo', 'rk'), joined('fa', 'rm'), joined('ro', 'ot'), joined('ho', 'me'), joined('tm', 'p'))})/`);
const registryHost = new RegExp(anyOf(joined('npm', 'js\\.(org|com)'), joined('yarn', 'pkg\\.com'), joined('py', 'pi\\.org'), joined('deb', '\\.debian\\.org'), joined('node', 'source\\.com')));
const unfinished = new RegExp(`\\b(${anyOf(joined('TO', 'DO'), joined('FIX', 'ME'), joined('XX', 'X'), joined('HA', 'CK'))})\\b|${joined('not', ' implemented')}|${joined('coming', ' soon')}|${joined('lorem', ' ipsum')}`);
const switchedOff = new RegExp(`\\b(it|test|describe|suite)\\.(${anyOf(joined('on', 'ly'), joined('sk', 'ip'), joined('to', 'do'), joined('fix', 'me'))})\\b`);
const fixedWait = new RegExp(joined('waitFor', 'Timeout'));

function hits(pattern: RegExp, files: RegExp): string[] {
  return sourceFiles(files).flatMap(({ path, text }) =>
    text.split('\n').flatMap((line, i) => (pattern.test(line) ? [`${path}:${String(i + 1)}: ${line.trim().slice(0, 120)}`] : [])),
  );
}

const everything = /./;
const notTheLock = /^(?!package-lock\.json$)/;

describe('the text of the project', () => {
  it('names no path of one machine', () => {
    expect(hits(machinePath, everything)).toEqual([]);
  });

  it('names no package registry', () => {
    expect(hits(registryHost, everything)).toEqual([]);
  });

  it('has no mark of unfinished work', () => {
    expect(hits(unfinished, notTheLock)).toEqual([]);
  });

  it('switches no test off and waits no fixed time in one', () => {
    expect(hits(switchedOff, /^tests\//)).toEqual([]);
    expect(hits(fixedWait, /^tests\//)).toEqual([]);
  });
});
