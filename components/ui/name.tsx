/** What a person wrote, kept apart from the direction of the words around it: a name cannot reorder a sentence. */
export function Name({ children }: Readonly<{ children: string }>) {
  return <bdi>{children}</bdi>
}
