import ts from 'typescript';
import { describe, expect, it } from 'vitest';

import { sourceFiles } from './sourceFiles';

/** Names that Expo Router reads from a route file beside its default export. */
const readByRouter = new Set(['default', 'unstable_settings', 'ErrorBoundary']);

function exportedNames(path: string, text: string): string[] {
  const file = ts.createSourceFile(path, text, ts.ScriptTarget.ES2023, true, ts.ScriptKind.TSX);
  return file.statements.flatMap((statement) => {
    if (ts.isExportAssignment(statement)) return ['default'];
    if (ts.isExportDeclaration(statement)) {
      const clause = statement.exportClause;
      return clause !== undefined && ts.isNamedExports(clause) ? clause.elements.map((element) => element.name.text) : ['*'];
    }
    const modifiers = ts.canHaveModifiers(statement) ? (ts.getModifiers(statement) ?? []) : [];
    if (!modifiers.some((m) => m.kind === ts.SyntaxKind.ExportKeyword)) return [];
    if (modifiers.some((m) => m.kind === ts.SyntaxKind.DefaultKeyword)) return ['default'];
    if (ts.isVariableStatement(statement)) return statement.declarationList.declarations.map((d) => d.name.getText(file));
    return ts.isFunctionDeclaration(statement) || ts.isClassDeclaration(statement) ? [statement.name?.text ?? ''] : [];
  });
}

describe('route files', () => {
  const routes = sourceFiles(/^app\/.*\.tsx?$/);

  it('are there', () => {
    expect(routes.length).toBeGreaterThan(2);
  });

  it.each(routes)('$path shows one screen and does nothing else', ({ path, text }) => {
    const names = exportedNames(path, text);
    expect(names.filter((name) => name === 'default')).toHaveLength(1);
    expect(names.filter((name) => !readByRouter.has(name))).toEqual([]);
    expect(text.trimEnd().split('\n').length, 'lines').toBeLessThanOrEqual(40);
    expect(text).not.toMatch(/\b(StyleSheet|fetch\(|createMachine|createActor|useMachine|useActor)\b/);
  });
});
