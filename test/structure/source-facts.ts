// What one source file imports, exports and mentions, read from its syntax tree. Names that the file itself binds are
// not mentions of the world outside: `document` as a parameter is the file's own.

import { parseSync } from 'vite';

/** A relation to another module. */
export interface Link {
  readonly specifier: string;
  /** Names taken from there; none for a mere import of the module. */
  readonly names: readonly string[];
  /** `address` is new URL('...', import.meta.url), the way to a worker's file. */
  readonly kind: 'import' | 'export' | 'dynamic' | 'address';
  readonly line: number;
}

/** Something mentioned, and where. */
export interface Mention {
  readonly name: string;
  readonly line: number;
}

export interface SourceFacts {
  readonly links: readonly Link[];
  /** Names this file exports, those it passes on included; `*` for everything of another module. */
  readonly exports: readonly Mention[];
  /** Free names: used here and bound nowhere in the file. */
  readonly freeNames: readonly Mention[];
  /** Names behind a dot, in any expression. */
  readonly members: readonly Mention[];
  /** Members of Math; `?` where Math is used in any other way. */
  readonly math: readonly Mention[];
  /** Powers `a ** b` that are neither whole-number arithmetic nor raised to a whole number written out. */
  readonly powers: readonly Mention[];
  /** Statements other than imports and passed-on exports. */
  readonly statements: readonly Mention[];
}

interface Node {
  readonly type: string;
  readonly start: number;
  readonly [key: string]: unknown;
}

/** Whether `file` has facts to read: TypeScript, with or without JSX. */
export function isCode(file: string): boolean {
  return /\.tsx?$/.test(file);
}

const known = new Map<string, { readonly text: string; readonly facts: SourceFacts }>();

/** The facts of the TypeScript file `file`, read once for each text of it. Throws where it does not parse. */
export function readFacts(file: string, text: string): SourceFacts {
  const before = known.get(file);
  if (before?.text === text) return before.facts;
  const { program, errors } = parseSync(file, text);
  if (errors.length > 0) throw new Error(`${file}: ${errors[0].message}`);
  const reader = new FactReader(text);
  reader.visit(program as unknown as Node, null, '');
  const facts = reader.facts();
  known.set(file, { text, facts });
  return facts;
}

const isNode = (value: unknown): value is Node =>
  typeof value === 'object' && value !== null && typeof (value as Node).type === 'string';
const nodesOf = (value: unknown): Node[] => (Array.isArray(value) ? value.filter(isNode) : []);
const nameOf = (node: unknown): string => {
  if (!isNode(node)) return '';
  return node.type === 'Literal' ? String(node.value) : String(node.name ?? '');
};

/** Positions in which an identifier is a label of something, not a use of a name. */
const LABELS = new Set(
  `
  MemberExpression.property Property.key MethodDefinition.key PropertyDefinition.key TSPropertySignature.key
  TSMethodSignature.key TSAbstractMethodDefinition.key TSQualifiedName.right TSEnumMember.id
  LabeledStatement.label BreakStatement.label ContinueStatement.label MetaProperty.meta MetaProperty.property
  TSNamedTupleMember.label TSTypePredicate.parameterName ImportSpecifier.imported ExportSpecifier.exported
  TSTypeParameter.name
  `
    .trim()
    .split(/\s+/),
);

class FactReader {
  private readonly links: Link[] = [];
  private readonly exports: Mention[] = [];
  private readonly names: Mention[] = [];
  private readonly members: Mention[] = [];
  private readonly math: Mention[] = [];
  private readonly powers: Mention[] = [];
  private readonly statements: Mention[] = [];
  private readonly bound = new Set<string>();
  /** Local name of `import * as name` to the names taken through it. */
  private readonly namespaces = new Map<string, string[]>();

  /** Where the lines of the text begin. */
  private readonly lineStarts: readonly number[];

  constructor(text: string) {
    this.lineStarts = [0, ...[...text.matchAll(/\n/g)].map(({ index }) => index + 1)];
  }

  facts(): SourceFacts {
    const { links, exports, members, math, powers, statements } = this;
    const freeNames = this.names.filter((mention) => !this.bound.has(mention.name));
    return { links, exports, freeNames, members, math, powers, statements };
  }

  visit(node: Node, parent: Node | null, role: string): void {
    this.collect(node, parent, role);
    for (const [key, value] of Object.entries(node)) {
      if (isNode(value)) this.visit(value, node, key);
      else for (const child of nodesOf(value)) this.visit(child, node, key);
    }
  }

  private mention(name: string, node: Node): Mention {
    let [low, high] = [0, this.lineStarts.length];
    while (high - low > 1) {
      const middle = (low + high) >> 1;
      if (this.lineStarts[middle] <= node.start) low = middle;
      else high = middle;
    }
    return { name, line: low + 1 };
  }

  private link(node: Node, specifier: string, kind: Link['kind'], names: readonly string[]): void {
    this.links.push({ specifier, names, kind, line: this.mention('', node).line });
  }

  private collect(node: Node, parent: Node | null, role: string): void {
    switch (node.type) {
      case 'Program':
        for (const statement of nodesOf(node.body)) this.statement(statement);
        break;
      case 'Identifier':
        this.identifier(node, parent, role);
        break;
      case 'MemberExpression':
        this.member(node);
        break;
      case 'TSQualifiedName':
        this.namespaces.get(nameOf(node.left))?.push(nameOf(node.right));
        break;
      case 'BinaryExpression':
        if (node.operator === '**' && !isExactPower(node)) this.powers.push(this.mention('**', node));
        break;
      case 'AssignmentExpression':
        if (node.operator === '**=' && !isExactPower(node)) this.powers.push(this.mention('**', node));
        break;
      case 'ImportExpression':
      case 'TSImportType':
        this.link(node, nameOf(node.source), 'dynamic', ['*']);
        break;
      case 'NewExpression':
        if (nameOf(node.callee) === 'URL' && nodesOf(node.arguments)[0]?.type === 'Literal') {
          this.link(node, nameOf(nodesOf(node.arguments)[0]), 'address', []);
        }
        break;
      case 'VariableDeclarator':
        this.bind(node.id);
        break;
      case 'CatchClause':
        this.bind(node.param);
        break;
      case 'TSTypeParameter':
        this.bind(node.name);
        break;
      case 'TSMappedType':
        this.bind(node.key);
        break;
      default:
        if (/Function|Signature|ConstructorType|Method/.test(node.type)) {
          for (const parameter of nodesOf(node.params)) this.bind(parameter);
        }
        if (/Function|Class|Interface|TypeAlias|Enum/.test(node.type)) this.bind(node.id);
    }
  }

  private statement(node: Node): void {
    const source = isNode(node.source) ? nameOf(node.source) : null;
    if (node.type === 'ImportDeclaration') {
      const specifiers = nodesOf(node.specifiers);
      for (const specifier of specifiers) this.bind(specifier.local);
      const names: string[] = [];
      for (const specifier of specifiers) {
        if (specifier.type === 'ImportNamespaceSpecifier') this.namespaces.set(nameOf(specifier.local), names);
        else names.push(specifier.type === 'ImportSpecifier' ? nameOf(specifier.imported) : 'default');
      }
      this.link(node, source ?? '', 'import', names);
      return;
    }
    if (node.type === 'ExportAllDeclaration') {
      this.link(node, source ?? '', 'export', ['*']);
      this.exports.push(this.mention(nameOf(node.exported) || '*', node));
      return;
    }
    if (node.type === 'ExportNamedDeclaration') {
      const specifiers = nodesOf(node.specifiers);
      for (const specifier of specifiers) this.exports.push(this.mention(nameOf(specifier.exported), specifier));
      if (source !== null) {
        this.link(
          node,
          source,
          'export',
          specifiers.map((specifier) => nameOf(specifier.local)),
        );
        return;
      }
      if (isNode(node.declaration))
        for (const name of declaredNames(node.declaration)) this.exports.push(this.mention(name, node));
    }
    if (node.type === 'ExportDefaultDeclaration') this.exports.push(this.mention('default', node));
    this.statements.push(this.mention(node.type, node));
  }

  private identifier(node: Node, parent: Node | null, role: string): void {
    const place = `${parent?.type}.${role}`;
    if (LABELS.has(place) && parent?.computed !== true) return;
    const name = nameOf(node);
    if (name === 'Math' && !(place === 'MemberExpression.object' && parent?.computed !== true)) {
      this.math.push(this.mention('?', node));
    }
    this.names.push(this.mention(name, node));
  }

  private member(node: Node): void {
    if (node.computed === true) return;
    const name = nameOf(node.property);
    const object = nameOf(node.object);
    this.members.push(this.mention(name, node));
    if (object === 'Math') this.math.push(this.mention(name, node));
    this.namespaces.get(object)?.push(name);
  }

  private bind(pattern: unknown): void {
    for (const name of boundNames(pattern)) this.bound.add(name);
  }
}

function declaredNames(declaration: Node): string[] {
  if (declaration.type !== 'VariableDeclaration') return [nameOf(declaration.id)];
  return nodesOf(declaration.declarations).flatMap((declarator) => boundNames(declarator.id));
}

function boundNames(pattern: unknown): string[] {
  if (!isNode(pattern)) return [];
  switch (pattern.type) {
    case 'Identifier':
      return [nameOf(pattern)];
    case 'ObjectPattern':
      return nodesOf(pattern.properties).flatMap((property) => boundNames(property.value ?? property.argument));
    case 'ArrayPattern':
      return nodesOf(pattern.elements).flatMap(boundNames);
    case 'AssignmentPattern':
      return boundNames(pattern.left);
    case 'RestElement':
      return boundNames(pattern.argument);
    case 'TSParameterProperty':
      return boundNames(pattern.parameter);
    default:
      return [];
  }
}

function isExactPower({ left, right }: Node): boolean {
  return isBigInt(left) || isBigInt(right) || isWholeNumber(right);
}

function isBigInt(node: unknown): boolean {
  return isNode(node) && node.type === 'Literal' && typeof node.bigint === 'string';
}

function isWholeNumber(node: unknown): boolean {
  if (!isNode(node)) return false;
  if (node.type === 'UnaryExpression' && node.operator === '-') return isWholeNumber(node.argument);
  return node.type === 'Literal' && Number.isInteger(node.value);
}
