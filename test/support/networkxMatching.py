"""Minimum-weight perfect matchings by networkx, an independent solver.

Reads a JSON list of {"n": vertices, "cost": whole costs of the pairs (0,1), (0,2), ..., (n-2,n-1)} from
standard input and writes the list of the least totals. Whole numbers are exact in Python.
"""

import json
import sys

import networkx

totals = []
for case in json.load(sys.stdin):
    graph = networkx.Graph()
    n = case["n"]
    costs = iter(case["cost"])
    for i in range(n):
        for j in range(i + 1, n):
            graph.add_edge(i, j, weight=next(costs))
    pairs = networkx.min_weight_matching(graph)
    assert 2 * len(pairs) == n
    totals.append(sum(graph[i][j]["weight"] for i, j in pairs))
json.dump(totals, sys.stdout)
