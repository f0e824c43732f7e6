import ts from 'typescript';
import { describe, expect, it } from 'vitest';

import { sourceFiles } from './sourceFiles';

/** Exported functions of a file that have no doc block, as `path: name`. */
function undocumented({ path, text }: { path: string; text: string }): string[] {
  const file = ts.createSourceFile(path, text, ts.ScriptTarget.ES2023, true);
  const names: string[] = [];
  for (const statement of file.statements) {
    const exported = ts.canHaveModifiers(statement) && (ts.getModifiers(statement) ?? []).some((m) => m.kind === ts.SyntaxKind.ExportKeyword);
    if (!exported || ts.getJSDocCommentsAndTags(statement).length > 0) continue;
    if (ts.isFunctionDeclaration(statement)) {
      // The signatures of an overloaded function share one doc block, above the first.
      if (!names.includes(statement.name?.text ?? '') && !isLaterOverload(file, statement)) names.push(statement.name?.text ?? 'default');
    } else if (ts.isVariableStatement(statement)) {
      for (const { name, initializer } of statement.declarationList.declarations) {
        if (initializer !== undefined && (ts.isArrowFunction(initializer) || ts.isFunctionExpression(initializer))) names.push(name.getText(file));
      }
    }
  }
  return names.map((name) => `${path}: ${name}`);
}

function isLaterOverload(file: ts.SourceFile, statement: ts.FunctionDeclaration): boolean {
  const before = file.statements[file.statements.indexOf(statement) - 1];
  return before !== undefined && ts.isFunctionDeclaration(before) && before.name?.text === statement.name?.text;
}

describe('exported functions', { timeout: 30_000 }, () => {
  // Migrations are read by name and say what they do in their head.
  it.each(['flows', 'shared', 'server', 'db'])('of %s say what they do', (room) => {
    const files = sourceFiles(new RegExp(`^${room}/(?!migrations/).*\\.tsx?$`));
    expect(files.flatMap(undocumented)).toEqual([]);
  });
});
