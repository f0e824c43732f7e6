/** `prove`: the proof of a tree over all its paths, on one profile or for issue. */
import { parseProfile, parseTree } from '@/flows/document/parseTree';
import { defaultSettings } from '@/flows/document/settings';
import { prove as proveOn } from '@/flows/proof/prove';
import { proveForIssue } from '@/flows/proof/proveForIssue';
import { readArgs, readDocument } from './args';
import type { Command } from './args';
import { libraryTrees } from './library';

const usage = 'prove TREE.json [--profile PROFILE.json] [--callee FILE]…';
const options = { profile: { type: 'string' }, callee: { type: 'string', multiple: true } } as const;

export const prove: Command = {
  name: 'prove',
  usage,
  about: ['Checks every house rule over every path of a tree; a broken rule comes with its shortest path, told as a story.', 'Without a profile: the proof for issue, over the built-in odd machines that the tree applies to.'],
  async run(argv) {
    const { file, values } = readArgs(argv, options, usage);
    const tree = await readDocument(file, parseTree);
    const given = await Promise.all((values.callee ?? []).map((name) => readDocument(name, parseTree)));
    const callees = [...given, ...(await libraryTrees()).filter((t) => !given.some((g) => g.id === t.id))];
    const settings = defaultSettings;
    if (values.profile === undefined) {
      const { holds, rules, provedOn, leftOut } = proveForIssue({ tree, callees, profiles: [], settings });
      return { good: holds, output: { holds, rules: rules.map(({ id, holds: ok, path, story, profile }) => ({ id, holds: ok, path, story, ...(profile === null ? {} : { profile }) })), provedOn, leftOut } };
    }
    const { holds, rules } = proveOn({ tree, callees, profile: await readDocument(values.profile, parseProfile), settings });
    return { good: holds, output: { holds, rules: rules.map(({ id, holds: ok, path, story }) => ({ id, holds: ok, path, story })) } };
  },
};
