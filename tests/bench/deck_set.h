// The decks of a plan, each as we write it and as a designer would script it.

#ifndef GATEDYNO_TESTS_BENCH_DECK_SET_H_
#define GATEDYNO_TESTS_BENCH_DECK_SET_H_

#include <filesystem>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "tests/bench/scene.h"

namespace gatedyno {

// A deck that serves both output edges of an arc's pin.
struct SampleDeck {
  std::string name;
  Job job;
  std::string script;
};

// Each deck once, as somebody would who saw that both edges share theirs.
// REQUIRES: the plan names its fanouts, all of them whole.
std::vector<SampleDeck> DecksOf(const Scene& scene);

// Ours into `careful`, the others into `script` unless that is empty.
Status WriteDecks(const std::vector<SampleDeck>& decks,
                  const std::filesystem::path& careful,
                  const std::filesystem::path& script);

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_BENCH_DECK_SET_H_
