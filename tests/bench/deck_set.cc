#include "tests/bench/deck_set.h"

#include <set>
#include <utility>

#include <fmt/format.h>

#include "harness/base/file.h"
#include "tests/bench/script_deck.h"

namespace gatedyno {

std::vector<SampleDeck> DecksOf(const Scene& scene) {
  std::vector<SampleDeck> decks;
  std::set<std::string> keys;
  for (StageTest test : scene.Tests()) {
    for (const double fanout : scene.run->plan.fanouts) {
      test.fanout = fanout;
      Job job = StageJob(scene.bench, test);
      if (!keys.insert(job.key).second) {
        continue;
      }
      std::string script = ScriptDeck(scene.bench, test, job);
      decks.push_back({fmt::format("{:04}.sp", decks.size()),
                       std::move(job),
                       std::move(script)});
    }
  }
  return decks;
}

Status WriteDecks(const std::vector<SampleDeck>& decks,
                  const std::filesystem::path& careful,
                  const std::filesystem::path& script) {
  for (const SampleDeck& deck : decks) {
    for (const Status& written :
         {WriteFile(careful / deck.name, DeckText(deck.job, 0)),
          script.empty() ? Ok() : WriteFile(script / deck.name, deck.script)}) {
      if (!written.ok()) {
        return written;
      }
    }
  }
  return Ok();
}

}  // namespace gatedyno
