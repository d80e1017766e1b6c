import ts from "typescript";
import { parsed } from "./imports.ts";

const globals = new Set(["fetch", "localStorage", "sessionStorage"]);
const members = new Set(["Date.now", "Math.random"]);
const globalObjects = new Set(["globalThis", "window", "self"]);

/** Where a source reads the clock, chance, storage or the network itself: `line 12: Date.now`. */
export function effectsIn(path: string, text: string): readonly string[] {
  const source = parsed(path, text);
  const found: string[] = [];
  const declared = new Set<string>();
  const note = (node: ts.Node, what: string): void => {
    found.push(`line ${source.getLineAndCharacterOfPosition(node.getStart()).line + 1}: ${what}`);
  };
  const visit = (node: ts.Node): void => {
    if ((ts.isParameter(node) || ts.isVariableDeclaration(node) || ts.isBindingElement(node)) && ts.isIdentifier(node.name)) {
      declared.add(node.name.text);
    }
    if (ts.isPropertyAccessExpression(node)) {
      if (members.has(node.getText())) note(node, node.getText());
      if (globalObjects.has(node.expression.getText()) && globals.has(node.name.text)) note(node, node.getText());
    }
    if (ts.isNewExpression(node) && node.expression.getText() === "Date" && !node.arguments?.length) note(node, "new Date()");
    ts.forEachChild(node, visit);
  };
  visit(source);
  // An argument of that name is the permitted way in, so a file that declares one is left to the linter, which knows scopes.
  const visitNames = (node: ts.Node): void => {
    if (ts.isIdentifier(node) && globals.has(node.text) && !declared.has(node.text) && isRead(node)) note(node, node.text);
    ts.forEachChild(node, visitNames);
  };
  visitNames(source);
  return found;
}

/** A use of the name itself: not a member or key of that name, nor a type. */
function isRead(node: ts.Identifier): boolean {
  const { parent } = node;
  if (ts.isPropertyAccessExpression(parent)) return parent.expression === node;
  return !(ts.isPropertyAssignment(parent) && parent.name === node) && !ts.isTypeElement(parent) && !ts.isClassElement(parent);
}
