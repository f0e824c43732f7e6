/** Which nodes wires join to one another. */

/** Sets of nodes, each set joined by wires (union–find). */
export class Joined {
  private readonly parents = new Map<string, string>();

  private root(node: string): string {
    let at = node;
    for (let up = this.parents.get(at); up !== undefined && up !== at; up = this.parents.get(at)) at = up;
    this.parents.set(node, at);
    return at;
  }

  join(a: string, b: string): void {
    this.parents.set(this.root(a), this.root(b));
  }

  same(a: string, b: string): boolean {
    return this.root(a) === this.root(b);
  }
}
