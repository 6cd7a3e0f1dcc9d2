/** Reads the sources of the house as the compiler sees them: files, imports, exports and their docstrings. */
import { readdirSync, readFileSync } from 'node:fs'
import { dirname, join, relative, sep } from 'node:path'
import { fileURLToPath } from 'node:url'
import ts from 'typescript'

/** The top of the repository. */
export const root = fileURLToPath(new URL('../..', import.meta.url))

/** Every file under a folder of the repository, as paths from its top with forward slashes. */
export const filesUnder = (folder: string): string[] =>
  readdirSync(join(root, folder), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => relative(root, join(entry.parentPath, entry.name)).split(sep).join('/'))
    .sort()

/** The text of a file of the repository. */
export const textOf = (path: string): string => readFileSync(join(root, path), 'utf8')

const isSource = (path: string): boolean => /\.(ts|mjs|vue)$/.test(path) && !path.endsWith('.d.ts')

/** The program's sources: everything under engine and app that is code. */
export const sources: readonly string[] = [...filesUnder('engine'), ...filesUnder('app')].filter(isSource)

const parse = (path: string): ts.SourceFile =>
  ts.createSourceFile(path, textOf(path), ts.ScriptTarget.Latest, true, ts.ScriptKind.TS)

/** What a file imports or re-exports, types included, statically or with `import()`. */
export const importsOf = (path: string): string[] => {
  const found: string[] = []
  const visit = (node: ts.Node): void => {
    if (ts.isImportDeclaration(node) || ts.isExportDeclaration(node)) {
      if (node.moduleSpecifier && ts.isStringLiteral(node.moduleSpecifier))
        found.push(node.moduleSpecifier.text)
    } else if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) {
      const [target] = node.arguments
      found.push(target && ts.isStringLiteralLike(target) ? target.text : '(computed)')
    } else if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument)) {
      if (ts.isStringLiteral(node.argument.literal)) found.push(node.argument.literal.text)
    }
    ts.forEachChild(node, visit)
  }
  visit(parse(path))
  return found
}

/** A relative import as a path from the top of the repository; a package or builtin stays as it is. */
export const resolved = (from: string, specifier: string): string =>
  specifier.startsWith('.') ? join(dirname(from), specifier).split(sep).join('/') : specifier

/** Exported functions, constants and classes that no docstring introduces. */
export const undocumentedExports = (path: string): string[] =>
  parse(path).statements.flatMap((statement) => {
    const value =
      ts.isFunctionDeclaration(statement) ||
      ts.isVariableStatement(statement) ||
      ts.isClassDeclaration(statement) ||
      ts.isExportAssignment(statement)
    if (!value) return []
    const exported =
      ts.isExportAssignment(statement) ||
      ts.getModifiers(statement)?.some((modifier) => modifier.kind === ts.SyntaxKind.ExportKeyword)
    if (!exported || ts.getJSDocCommentsAndTags(statement).length > 0) return []
    return [statement.getText().split('\n')[0] ?? '']
  })
