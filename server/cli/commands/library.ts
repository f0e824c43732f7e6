/** The starter trees that ship with the product, read from their files: they are what a tree may call. */
import { readdir } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';

import { parseTree } from '@/flows/document/parseTree';
import type { Tree } from '@/flows/document/tree';
import { readDocument } from './args';

const folder = fileURLToPath(new URL('../../../flows/library/', import.meta.url));

/** Every tree of the library. @throws BadInput when one of them is damaged */
export async function libraryTrees(): Promise<Tree[]> {
  const files = (await readdir(folder)).filter((name) => name.endsWith('.json')).sort();
  return Promise.all(files.map((name) => readDocument(`${folder}${name}`, parseTree)));
}
