/** What the sheet's own JSON Schema is made of, as far as its words are used here. */
export interface SchemaNode {
  readonly title?: string;
  readonly $ref?: string;
  readonly $defs?: Readonly<Record<string, SchemaNode>>;
  readonly properties?: Readonly<Record<string, SchemaNode>>;
  readonly additionalProperties?: boolean | SchemaNode;
  readonly items?: SchemaNode;
  readonly type?: string | readonly string[];
  readonly enum?: readonly string[];
  readonly const?: string;
  readonly examples?: readonly unknown[];
}
