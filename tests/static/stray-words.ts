import ts from 'typescript';
import { parseSource, placeOf, type Source, walk } from './sources.ts';

const readByPeople = /^src\/(pages|layouts|components|features|worker)\//;

/** Pages that only developers see; they are absent from live mode and stay in English. */
const developerPages = /^src\/(pages|components)\/.*\bpieces\b/;

/** Attributes and properties whose text is shown or read aloud. */
const shownNames = new Set([
  'alt',
  'aria-description',
  'aria-label',
  'aria-roledescription',
  'aria-valuetext',
  'caption',
  'description',
  'help',
  'hint',
  'label',
  'message',
  'note',
  'placeholder',
  'summary',
  'text',
  'title',
]);

/** Each text for people that is written in the code instead of in `locales/`. */
export function findStrayWords(sources: Source[]): string[] {
  const bound = sources.filter(
    ({ path }) =>
      readByPeople.test(path) && !developerPages.test(path) && !/\.(test|bench)\.tsx?$/.test(path),
  );
  return bound.flatMap((source) =>
    walk(parseSource(source))
      .filter((node) => isStray(node))
      .map((node) => `${placeOf(source, node)}: ${node.getText().trim()}`),
  );
}

function isStray(node: ts.Node): boolean {
  if (ts.isJsxText(node)) return hasWord(node.text) && !isForNoTranslation(node.parent);
  if (!ts.isStringLiteralLike(node) && !ts.isTemplateExpression(node)) return false;
  if (isForProgrammers(node)) return false;
  const text = textOf(node);
  return (isShown(node) && startsLikeText(text)) || looksLikeSentence(text);
}

/** The words of a literal; what a template fills in counts as one letter. */
function textOf(node: ts.StringLiteralLike | ts.TemplateExpression): string {
  if (ts.isStringLiteralLike(node)) return node.text;
  return node.head.text + node.templateSpans.map((span) => `x${span.literal.text}`).join('');
}

function hasWord(text: string): boolean {
  return /\p{L}{2}/u.test(text);
}

function startsLikeText(text: string): boolean {
  return /^\p{Lu}\p{Ll}/u.test(text);
}

function looksLikeSentence(text: string): boolean {
  // A name as a machine's panel shows it: in capitals, and the same in every language.
  if (/^[\p{Lu}\d ]{1,12}$/u.test(text)) return false;
  const tokens = text.trim().split(/\s+/);
  const words = tokens.filter((token) => /^["'“„«(]?\p{L}[\p{L}'’-]*["'”»)]?[.,;:!?…]?$/u.test(token));
  const isMostlyWords = words.length >= 2 && words.length >= tokens.length * 0.6;
  return isMostlyWords && (/^["'“„«(]?\p{Lu}/u.test(text.trim()) || /\p{L}[.!?…]$/u.test(text.trim()));
}

function isShown(node: ts.Node): boolean {
  const { parent } = node;
  if (ts.isJsxAttribute(parent)) return shownNames.has(parent.name.getText());
  if (ts.isJsxExpression(parent) && ts.isJsxAttribute(parent.parent))
    return shownNames.has(parent.parent.name.getText());
  return (
    ts.isPropertyAssignment(parent) && parent.initializer === node && shownNames.has(parent.name.getText())
  );
}

/** `translate="no"` marks names: of the product, of languages, as their owners write them. */
function isForNoTranslation(node: ts.Node): boolean {
  if (!ts.isJsxElement(node)) return false;
  return node.openingElement.attributes.properties.some(
    (attribute) =>
      ts.isJsxAttribute(attribute) &&
      attribute.name.getText() === 'translate' &&
      attribute.initializer?.getText().slice(1, -1) === 'no',
  );
}

/** Imports, types, thrown errors and log lines are read by those who write the product. */
function isForProgrammers(node: ts.Node): boolean {
  const { parent } = node;
  if (ts.isImportDeclaration(parent) || ts.isExportDeclaration(parent) || ts.isLiteralTypeNode(parent))
    return true;
  for (let above = parent; !ts.isSourceFile(above) && !ts.isStatement(above); above = above.parent) {
    if (ts.isNewExpression(above) && /Error$/.test(above.expression.getText())) return true;
    if (ts.isCallExpression(above) && /^(super$|log\.|console\.)/.test(above.expression.getText()))
      return true;
  }
  return false;
}
