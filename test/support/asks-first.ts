import ts from 'typescript'

/** A function that takes the actor, and the first call that it hands the actor to. */
export interface Asking {
  readonly name: string
  readonly exported: boolean
  /** Name of the function called with the actor; undefined when there is none, or when something is awaited before. */
  readonly first: string | undefined
}

type Callable = ts.FunctionDeclaration | ts.ArrowFunction | ts.FunctionExpression

const takesActor = ({ parameters }: Callable): boolean =>
  parameters.some(({ name }) => ts.isIdentifier(name) && name.text === 'actor')

/** What happens in the order in which it happens: arguments before their call, an operand before it is awaited. */
function* happenings(node: ts.Node): Generator<ts.CallExpression | ts.AwaitExpression> {
  for (const child of node.getChildren()) yield* happenings(child)
  if (ts.isCallExpression(node) || ts.isAwaitExpression(node)) yield node
}

const handsActorOn = ({ arguments: given }: ts.CallExpression): boolean =>
  given.some((one) => ts.isIdentifier(one) && one.text === 'actor')

function firstAsked(body: ts.Node): string | undefined {
  for (const happening of happenings(body)) {
    if (ts.isAwaitExpression(happening)) return undefined
    if (handsActorOn(happening)) return happening.expression.getText()
  }
  return undefined
}

/** Every function of a source text that takes an actor, and whom it asks first. */
export function askings(text: string): readonly Asking[] {
  const source = ts.createSourceFile('service.ts', text, ts.ScriptTarget.Latest, true)
  const isExported = (node: ts.HasModifiers): boolean =>
    ts.getModifiers(node)?.some(({ kind }) => kind === ts.SyntaxKind.ExportKeyword) ?? false
  return source.statements.flatMap((statement): readonly Asking[] => {
    const found: readonly (readonly [string, ts.Node | undefined])[] = ts.isVariableStatement(statement)
      ? statement.declarationList.declarations.map((one) => [one.name.getText(), one.initializer])
      : ts.isFunctionDeclaration(statement)
        ? [[statement.name?.text ?? 'default', statement]]
        : []
    return found.flatMap(([name, node]) => {
      if (node === undefined) return []
      if (!ts.isFunctionDeclaration(node) && !ts.isArrowFunction(node) && !ts.isFunctionExpression(node))
        return []
      if (!takesActor(node) || node.body === undefined) return []
      const exported = ts.canHaveModifiers(statement) && isExported(statement)
      return [{ name, exported, first: firstAsked(node.body) }]
    })
  })
}

/**
 * The exported functions that do not ask for the right before they wait for anything. Asking is a call of `permit`,
 * or of `may` (for lists that show each what is theirs), or handing the actor to a function that asks.
 * @param texts the services, all of them: one may ask through another
 */
export function unasked(texts: readonly string[]): readonly string[] {
  const all = texts.flatMap(askings)
  const asks = new Set(['permit', 'may'])
  for (let size = 0; size !== asks.size; ) {
    size = asks.size
    for (const { first, name } of all) if (first !== undefined && asks.has(first)) asks.add(name)
  }
  return all.filter(({ exported, name }) => exported && !asks.has(name)).map(({ name }) => name)
}
