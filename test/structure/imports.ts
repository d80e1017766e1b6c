import ts from "typescript";

/** One import as written. */
export interface Import {
  /** Without a bundler's `?query`. */
  readonly specifier: string;
  /** Gone once compiled. */
  readonly typeOnly: boolean;
}

const withoutQuery = (specifier: string): string => specifier.replace(/\?.*$/, "");

/** What a source file reaches for: imports of every kind, `new URL("./worker.ts", import.meta.url)`, `@import`, `url()`, `src` and `href`. */
export function importsOf(path: string, text: string): readonly Import[] {
  if (path.endsWith(".html")) return matches(text, /\b(?:src|href)="([^"#:]+)"/g);
  if (path.endsWith(".css")) return matches(text, /(?:@import\s+|url\()["']([^"'#:]+)["']/g);
  const found: Import[] = [];
  const add = (node: ts.Node | undefined, typeOnly: boolean): void => {
    if (node && ts.isStringLiteralLike(node)) found.push({ specifier: withoutQuery(node.text), typeOnly });
  };
  const visit = (node: ts.Node): void => {
    if (ts.isImportDeclaration(node)) add(node.moduleSpecifier, node.importClause?.phaseModifier === ts.SyntaxKind.TypeKeyword);
    else if (ts.isExportDeclaration(node)) add(node.moduleSpecifier, node.isTypeOnly);
    else if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument)) add(node.argument.literal, true);
    else if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) add(node.arguments[0], false);
    else if (
      ts.isNewExpression(node) &&
      node.expression.getText() === "URL" &&
      node.arguments?.[1]?.getText() === "import.meta.url"
    ) {
      add(node.arguments[0], false);
    }
    ts.forEachChild(node, visit);
  };
  visit(parsed(path, text));
  return found;
}

export function parsed(path: string, text: string): ts.SourceFile {
  return ts.createSourceFile(path, text, ts.ScriptTarget.ES2023, true);
}

/** The package of a bare import: `d3-geo`, `@scope/name`, `node` for Node's own; nothing for a path. */
export function packageOf(specifier: string): string | undefined {
  if (/^[./]/.test(specifier)) return undefined;
  if (specifier.startsWith("node:")) return "node";
  return specifier
    .split("/")
    .slice(0, specifier.startsWith("@") ? 2 : 1)
    .join("/");
}

function matches(text: string, pattern: RegExp): readonly Import[] {
  return Array.from(text.matchAll(pattern), ([, specifier]) => ({ specifier: withoutQuery(specifier), typeOnly: false }));
}
