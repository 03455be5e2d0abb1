import Graph from 'graphology'
import { dijkstra } from 'graphology-shortest-path'
import { DISPLAY, START, type Arc, type ArcMap } from '@coaxwain/matcher'

/** The default order as one number that adds up: doubt, picture, boxes, pieces, each above the next. */
export const costOf = ({ doubt, tiersBelow, boxes, pieces }: Arc): number =>
  1 + pieces * 10 + boxes * 1000 + tiersBelow * 100_000 + doubt * 10_000_000

/** A graph of the library, built from the arcs; of arcs between the same two nodes it keeps the cheapest. */
export function buildGraph({ nodes, arcs }: ArcMap): Graph {
  const graph = new Graph({ type: 'directed', multi: false })
  for (let node = 0; node < nodes; node++) graph.addNode(node)
  arcs.forEach((arc, number) => {
    const cost = costOf(arc)
    const known = graph.edge(arc.from, arc.to)
    if (known === undefined) graph.addEdge(arc.from, arc.to, { cost, number })
    else if ((graph.getEdgeAttribute(known, 'cost') as number) > cost)
      graph.mergeEdge(arc.from, arc.to, { cost, number })
  })
  return graph
}

/** The cheapest path as numbers of arcs; null when there is none. */
export function cheapestPath(graph: Graph): number[] | null {
  const path = dijkstra.bidirectional(graph, String(START), String(DISPLAY), 'cost') as
    string[] | null
  return (
    path &&
    path
      .slice(1)
      .map((to, i) => graph.getEdgeAttribute(graph.edge(path[i]!, to), 'number') as number)
  )
}
