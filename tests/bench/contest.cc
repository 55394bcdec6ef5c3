#include "tests/bench/contest.h"

#include <fmt/format.h>

namespace gatedyno {

Status RunRounds(std::vector<Contender>* contenders) {
  constexpr int kMostRounds = 5;
  for (int round = 0; round < kMostRounds; ++round) {
    for (Contender& contender : *contenders) {
      if (round >= contender.rounds) {
        continue;
      }
      const Result<Spent> spent = contender.run();
      if (!spent.ok()) {
        return Forward(spent);
      }
      contender.wall_s.push_back(spent->wall_s);
      contender.processor_s.push_back(spent->processor_s);
    }
  }
  return Ok();
}

void PrintContenders(const std::vector<Contender>& contenders, size_t delays) {
  fmt::print("  {:<34} {:>8} {:>10} {:>12} {:>12} {:>7}\n",
             "medians",
             "s",
             "delays/s",
             "times ours",
             "processor s",
             "rounds");
  for (const Contender& contender : contenders) {
    fmt::print("  {:<34} {:>8.2f} {:>10.2f} {:>12.1f} {:>12.2f} {:>7}\n",
               contender.name,
               contender.median_s(),
               static_cast<double>(delays) / contender.median_s(),
               contender.median_s() / contenders.front().median_s(),
               Median(contender.processor_s),
               contender.wall_s.size());
  }
}

}  // namespace gatedyno
