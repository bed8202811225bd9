// Minimum-weight perfect matching by LEMON's MaxWeightedPerfectMatching, to be measured beside ours: the same
// points in the same order, the same candidate edges and whole costs, the same pricing of the complete graph by
// pairs of boxes, round after round until no pair is left out. LEMON has no warm start: each round solves anew.
//
// Argument: a file with int32 n, int32 m, double scale, double x[n], double y[n], int32 from[m], int32 to[m],
// int32 order[n], the last being a k-d order of the points, of which boxes are made. Prints one line of JSON.
#include <lemon/matching.h>
#include <lemon/smart_graph.h>
#include <sys/resource.h>

#include <algorithm>
#include <cmath>
#include <cstdio>
#include <cstdlib>
#include <limits>
#include <memory>
#include <string>
#include <vector>

typedef long long Whole;
typedef lemon::SmartGraph Graph;
typedef Graph::EdgeMap<Whole> Weights;
typedef lemon::MaxWeightedPerfectMatching<Graph, Weights> Solver;

static const int LEAF = 8;
static const int PER_VERTEX = 3;

struct Points {
  int n = 0;
  double scale = 1;
  std::vector<double> x, y;
  std::vector<int> order;
  Whole costAt(double distance) const { return 2 * static_cast<Whole>(std::floor(scale * distance)); }
  Whole cost(int u, int v) const {
    double dx = x[u] - x[v], dy = y[u] - y[v];
    return costAt(std::sqrt(dx * dx + dy * dy));
  }
};

// Nests of blossoms with skip pointers: the innermost common one in logarithmic time
// (Myers, Information Processing Letters 17, 1983).
struct Nests {
  std::vector<int> parent, skip, depth, root, inner;
  std::vector<Whole> sum;

  Nests(const Solver& solver, const Graph& graph, int n) : inner(n, -1) {
    int count = solver.blossomNum();
    parent.assign(count, -1);
    skip.resize(count);
    depth.assign(count, 0);
    root.resize(count);
    sum.resize(count);
    // LEMON lists a blossom after those inside it, and its nodes as a run of one list of all.
    std::vector<int> position(n, -1), nodeAt(n), begin(count), end(count), open;
    int at = 0;
    for (int b = count - 1; b >= 0; b--) {
      int first = graph.id(Solver::BlossomIt(solver, b));
      if (position[first] < 0) {
        for (Solver::BlossomIt it(solver, b); it != lemon::INVALID; ++it) {
          nodeAt[at] = graph.id(it);
          position[graph.id(it)] = at++;
        }
      }
      begin[b] = position[first];
      end[b] = begin[b] + solver.blossomSize(b);
      while (!open.empty() && (begin[b] < begin[open.back()] || end[b] > end[open.back()])) open.pop_back();
      if (open.empty()) {
        root[b] = skip[b] = b;
        sum[b] = solver.blossomValue(b);
      } else {
        int up = open.back(), far = skip[up];
        parent[b] = up;
        root[b] = root[up];
        depth[b] = depth[up] + 1;
        skip[b] = depth[up] - depth[far] == depth[far] - depth[skip[far]] ? skip[far] : up;
        sum[b] = sum[up] + solver.blossomValue(b);
      }
      open.push_back(b);
    }
    // Inner blossoms come first; each takes the vertices of its run that have none yet.
    std::vector<int> next(at + 1);
    for (int i = 0; i <= at; i++) next[i] = i;
    for (int b = 0; b < count; b++) {
      int i = begin[b];
      for (;;) {
        while (next[i] != i) i = next[i] = next[next[i]];
        if (i >= end[b]) break;
        inner[nodeAt[i]] = b;
        next[i] = i + 1;
      }
    }
  }

  int common(int a, int b) const {
    if (a == b) return a;
    if (a < 0 || b < 0 || root[a] != root[b]) return -1;
    while (depth[a] > depth[b]) a = depth[skip[a]] >= depth[b] ? skip[a] : parent[a];
    while (depth[b] > depth[a]) b = depth[skip[b]] >= depth[a] ? skip[b] : parent[b];
    while (a != b) {
      if (skip[a] != skip[b]) {
        a = skip[a];
        b = skip[b];
      } else {
        a = parent[a];
        b = parent[b];
      }
    }
    return a;
  }
};

// Blocks of 8, 16, 32 … points of the k-d order are the boxes.
struct Boxes {
  std::vector<std::vector<double>> minX, minY, maxX, maxY;

  explicit Boxes(const Points& p) {
    size_t count = (p.n + LEAF - 1) / LEAF;
    for (int level = 0;; level++) {
      double far = std::numeric_limits<double>::infinity();
      minX.emplace_back(count, far);
      minY.emplace_back(count, far);
      maxX.emplace_back(count, -far);
      maxY.emplace_back(count, -far);
      size_t below = level == 0 ? p.n : minX[level - 1].size();
      for (size_t i = 0; i < below; i++) {
        size_t box = level == 0 ? i / LEAF : i / 2;
        minX[level][box] = std::min(minX[level][box], level == 0 ? p.x[p.order[i]] : minX[level - 1][i]);
        minY[level][box] = std::min(minY[level][box], level == 0 ? p.y[p.order[i]] : minY[level - 1][i]);
        maxX[level][box] = std::max(maxX[level][box], level == 0 ? p.x[p.order[i]] : maxX[level - 1][i]);
        maxY[level][box] = std::max(maxY[level][box], level == 0 ? p.y[p.order[i]] : maxY[level - 1][i]);
      }
      if (count == 1) break;
      count = (count + 1) / 2;
    }
  }

  double distance(int level, int a, int b) const {
    double dx = std::max(0.0, std::max(minX[level][b] - maxX[level][a], minX[level][a] - maxX[level][b]));
    double dy = std::max(0.0, std::max(minY[level][b] - maxY[level][a], minY[level][a] - maxY[level][b]));
    return std::sqrt(dx * dx + dy * dy);
  }
};

struct Pricer {
  const Points& points;
  const Boxes& boxes;
  Nests nests;
  std::vector<Whole> value;
  std::vector<std::vector<Whole>> highest;
  std::vector<std::vector<int>> blossom;

  Pricer(const Points& p, const Boxes& b, const Solver& solver, const Graph& graph)
      : points(p), boxes(b), nests(solver, graph, p.n), value(p.n) {
    // LEMON's duals belong to the weights −cost, times dualScale.
    for (int v = 0; v < p.n; v++) value[v] = -solver.nodeValue(graph.nodeFromId(v));
    for (size_t level = 0; level < b.minX.size(); level++) {
      size_t count = b.minX[level].size(), below = level == 0 ? p.n : b.minX[level - 1].size();
      highest.emplace_back(count, std::numeric_limits<Whole>::min());
      blossom.emplace_back(count, -2);
      for (size_t i = 0; i < below; i++) {
        size_t box = level == 0 ? i / LEAF : i / 2;
        int inside = level == 0 ? nests.inner[p.order[i]] : blossom[level - 1][i];
        highest[level][box] = std::max(highest[level][box], level == 0 ? value[p.order[i]] : highest[level - 1][i]);
        blossom[level][box] = blossom[level][box] == -2 ? inside : nests.common(blossom[level][box], inside);
      }
    }
  }

  Whole shared(int a, int b) const {
    int common = nests.common(a, b);
    return common < 0 ? 0 : nests.sum[common];
  }

  // Pairs u, v with negative reduced cost, at most PER_VERTEX at a vertex.
  void find(std::vector<int>& from, std::vector<int>& to) const {
    struct Task {
      int level, a, b;
    };
    std::vector<char> added(points.n, 0);
    std::vector<Task> tasks;
    if (points.n > 0) tasks.push_back({static_cast<int>(boxes.minX.size()) - 1, 0, 0});
    while (!tasks.empty()) {
      Task t = tasks.back();
      tasks.pop_back();
      Whole least = Solver::dualScale * points.costAt(boxes.distance(t.level, t.a, t.b)) +
                    shared(blossom[t.level][t.a], blossom[t.level][t.b]);
      if (least >= highest[t.level][t.a] + highest[t.level][t.b]) continue;
      if (t.level > 0) {
        int below = boxes.minX[t.level - 1].size();
        for (int a = 2 * t.a; a < std::min(below, 2 * t.a + 2); a++)
          for (int b = t.a == t.b ? a : 2 * t.b; b < std::min(below, 2 * t.b + 2); b++)
            tasks.push_back({t.level - 1, a, b});
        continue;
      }
      for (int i = LEAF * t.a; i < std::min(points.n, LEAF * t.a + LEAF); i++) {
        for (int j = t.a == t.b ? i + 1 : LEAF * t.b; j < std::min(points.n, LEAF * t.b + LEAF); j++) {
          int u = points.order[i], v = points.order[j];
          if (added[u] >= PER_VERTEX || added[v] >= PER_VERTEX) continue;
          Whole cost = Solver::dualScale * points.cost(u, v);
          if (cost >= value[u] + value[v] || cost + shared(nests.inner[u], nests.inner[v]) >= value[u] + value[v])
            continue;
          added[u]++;
          added[v]++;
          from.push_back(u);
          to.push_back(v);
        }
      }
    }
  }
};

static double userSeconds(long* peakKb = nullptr) {
  rusage used;
  getrusage(RUSAGE_SELF, &used);
  if (peakKb != nullptr) *peakKb = used.ru_maxrss;
  return used.ru_utime.tv_sec + used.ru_utime.tv_usec / 1e6;
}

template <class T>
static void readInto(std::FILE* file, T* place, size_t count) {
  if (std::fread(place, sizeof(T), count, file) == count) return;
  std::fprintf(stderr, "the input file is cut short\n");
  std::exit(1);
}

int main(int argc, char** argv) {
  std::FILE* file = argc == 2 ? std::fopen(argv[1], "rb") : nullptr;
  if (file == nullptr) {
    std::fprintf(stderr, "one argument: the input file\n");
    return 2;
  }
  Points points;
  int m = 0;
  readInto(file, &points.n, 1);
  readInto(file, &m, 1);
  readInto(file, &points.scale, 1);
  points.x.resize(points.n);
  points.y.resize(points.n);
  points.order.resize(points.n);
  std::vector<int> from(m), to(m);
  readInto(file, points.x.data(), points.n);
  readInto(file, points.y.data(), points.n);
  readInto(file, from.data(), m);
  readInto(file, to.data(), m);
  readInto(file, points.order.data(), points.n);
  std::fclose(file);

  Boxes boxes(points);
  double solving = 0, firstSolve = 0;
  int rounds = 0;
  __int128 total = 0;
  for (;;) {
    Graph graph;
    graph.reserveNode(points.n);
    graph.reserveEdge(from.size());
    for (int v = 0; v < points.n; v++) graph.addNode();
    Weights weight(graph);
    for (size_t i = 0; i < from.size(); i++) {
      Graph::Edge e = graph.addEdge(graph.nodeFromId(from[i]), graph.nodeFromId(to[i]));
      weight[e] = -points.cost(from[i], to[i]);
    }
    double start = userSeconds();
    Solver solver(graph, weight);
    if (!solver.run()) {
      std::fprintf(stderr, "no perfect matching among the candidates\n");
      return 1;
    }
    double took = userSeconds() - start;
    solving += took;
    if (rounds++ == 0) firstSolve = took;
    size_t before = from.size();
    Pricer(points, boxes, solver, graph).find(from, to);
    if (from.size() > before) continue;
    for (int v = 0; v < points.n; v++) {
      int mate = graph.id(solver.mate(graph.nodeFromId(v)));
      if (v < mate) total += points.cost(v, mate);
    }
    break;
  }
  std::string digits;
  for (__int128 rest = total; rest > 0 || digits.empty(); rest /= 10) digits += static_cast<char>('0' + static_cast<int>(rest % 10));
  std::reverse(digits.begin(), digits.end());
  long peakKb = 0;
  double used = userSeconds(&peakKb);
  std::printf(
      "{\"userSeconds\":%.4f,\"firstSolveSeconds\":%.4f,\"solveSeconds\":%.4f,\"peakKb\":%ld,\"rounds\":%d,"
      "\"added\":%d,\"total\":\"%s\"}\n",
      used, firstSolve, solving, peakKb, rounds, static_cast<int>(from.size()) - m, digits.c_str());
}
