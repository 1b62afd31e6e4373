/** A binary heap of nodes by key, where a node whose key was lowered moves up. */
export class NearestFirst {
  size = 0;
  private readonly nodes: Int32Array;
  /** Place of each node in the heap, −1 when not in it. */
  private readonly place: Int32Array;

  constructor(private readonly key: Float64Array) {
    this.nodes = new Int32Array(key.length);
    this.place = new Int32Array(key.length).fill(-1);
  }

  clear(): void {
    for (let at = 0; at < this.size; at++) this.place[this.nodes[at]!] = -1;
    this.size = 0;
  }

  /** Node of the least key, which stays. */
  first(): number {
    return this.nodes[0]!;
  }

  /** Removes and returns the node of the least key. */
  take(): number {
    const { nodes, place } = this;
    const node = nodes[0]!;
    place[node] = -1;
    const last = nodes[--this.size]!;
    if (this.size > 0) this.sink(last, 0);
    return node;
  }

  /** Puts the node in, or moves it up after its key was lowered. */
  raise(node: number): void {
    const { key, nodes, place } = this;
    const own = key[node]!;
    let at = place[node]! < 0 ? this.size++ : place[node]!;
    while (at > 0) {
      const parent = nodes[(at - 1) >> 1]!;
      if (key[parent]! <= own) break;
      nodes[at] = parent;
      place[parent] = at;
      at = (at - 1) >> 1;
    }
    nodes[at] = node;
    place[node] = at;
  }

  /** Moves the node down, or up, after its key was changed in either direction. */
  renew(node: number): void {
    if (this.place[node]! < 0) this.raise(node);
    else {
      this.sink(node, this.place[node]!);
      this.raise(node);
    }
  }

  private sink(node: number, from: number): void {
    const { key, nodes, place, size } = this;
    const own = key[node]!;
    let at = from;
    for (;;) {
      let child = 2 * at + 1;
      if (child >= size) break;
      if (child + 1 < size && key[nodes[child + 1]!]! < key[nodes[child]!]!) child++;
      if (key[nodes[child]!]! >= own) break;
      const moved = nodes[child]!;
      nodes[at] = moved;
      place[moved] = at;
      at = child;
    }
    nodes[at] = node;
    place[node] = at;
  }
}
