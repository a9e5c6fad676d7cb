/** What a person wrote, kept apart from the direction of the words around it: a name cannot reorder a sentence. */
export function Name({ children, isAddress = false }: Readonly<{ children: string; isAddress?: boolean }>) {
  // An address reads from left to right in any script.
  return <bdi dir={isAddress ? 'ltr' : undefined}>{children}</bdi>
}
