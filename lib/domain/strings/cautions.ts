/**
 * What is said wherever strings are loaded or a table may lead someone to load one. Short, in the open, never
 * behind a click; they defer to local rules, to the instrument maker's rating and to qualified people.
 * Common practice, no source.
 */
export const rigCautions = [
  'A loaded string stores energy and can whip when it breaks. Wear eye protection; keep face and hands out of the plane of the string; guard it with a clear screen or tube.',
  'Hang the load low, a few centimetres above a padded tray, with a slack safety line; keep feet clear.',
  'Never exceed the stated fraction of the least breaking load. Release the load before cutting. Trimmed ends are sharp.',
  'Local rules and qualified people come before this page.',
] as const

/** On tension tables, datasheets and charts for customers. */
export const tensionTableCautions = [
  'A loaded string stores energy and can whip when it breaks: protect your eyes when you fit, tune or cut it, and slacken it before cutting.',
  'The total tension of a set has to stay within the instrument maker’s rating. This table is a calculation, not permission to fit the set.',
  'Worn, kinked, rusty or nicked strings break far below these values. Local rules come first; if in doubt, ask a qualified person.',
] as const
