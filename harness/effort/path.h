// Path sums of logical effort.
//
// For N stages in a row, each with g, p and branching b, from input
// capacitance C_in to load C_load:
//   G = product of g, B = product of b, H = C_load / C_in, F = G * B * H;
//   least delay at equal stage efforts f = F^(1/N): D = N * f + P, P = sum p;
//   stage i then has C_in(i) = g(i) * b(i) * C_out(i) / f, from the load back.
// Source: Sutherland, Sproull, Harris, Logical Effort, 1999.

#ifndef GATEDYNO_EFFORT_PATH_H_
#define GATEDYNO_EFFORT_PATH_H_

#include <span>
#include <vector>

namespace gatedyno {

struct PathStage {
  double effort = 1.0;     // g.
  double parasitic = 1.0;  // p, in tau.
  // (Load on the path + load off it) / load on the path, after this stage.
  double branching = 1.0;
};

struct PathSums {
  double logical_effort = 1.0;     // G.
  double branching_effort = 1.0;   // B.
  double electrical_effort = 1.0;  // H.
  double path_effort = 1.0;        // F.
  double stage_effort = 1.0;       // f at least delay.
  double parasitic = 0.0;          // P.
  double delay = 0.0;              // D, in tau.
};

// REQUIRES: at least one stage, all efforts > 0.
PathSums SumPath(std::span<const PathStage> stages, double electrical_effort);

// Input capacitance of every stage at equal stage efforts, in the unit of the
// load.  The first comes out as load / electrical effort.
std::vector<double> SizePath(std::span<const PathStage> stages,
                             double input_capacitance,
                             double load_capacitance);

// Delay of `stages` inverters with path effort F: N * F^(1/N) + N * p.
double ChainDelay(double path_effort, int stages, double parasitic);

// The stage count of least ChainDelay; the smaller of equals.
int BestStageCount(double path_effort, double parasitic);

// The path effort at which `stages` and `stages` + 1 are equally fast.
double StageCountCrossover(int stages, double parasitic);

// Stage effort rho of the best chain of stages with g and p, where the count is
// free: p + rho * (1 - ln rho) = 0 for g = 1, and g * rho(1, p / g) in general.
// e for p = 0.
double BestStageEffort(double parasitic, double effort = 1.0);

}  // namespace gatedyno

#endif  // GATEDYNO_EFFORT_PATH_H_
