#include "harness/record/job_json.h"

#include <limits>
#include <string>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using nlohmann::json;

Job SomeJob() {
  Job job;
  job.key = "00ff";
  job.label = "nand2 a->y h=4 typical";
  job.deck = "title\n.end\n";
  job.settings = {".options a\n", ".options b\n"};
  job.intervals = {
      {"delay", {"d_in", 0.5, Edge::kRise, 1}, {"d_y", 0.25, Edge::kFall, 2}}};
  job.swings = {{"d_y", 0.1, 0.9}};
  job.stop_s = 2.1e-9;
  job.time_limit_s = 30.0;
  return job;
}

// The names are stored in run files and spoken to workers of other builds.
TEST(JobJsonTest, AJobIsWrittenLikeThis) {
  EXPECT_EQ(JobToJson(SomeJob()), json::parse(R"({
    "key": "00ff",
    "label": "nand2 a->y h=4 typical",
    "deck": "title\n.end\n",
    "settings": [".options a\n", ".options b\n"],
    "intervals": [{
      "name": "delay",
      "from": {"net": "d_in", "level_v": 0.5, "edge": "rise", "occurrence": 1},
      "to": {"net": "d_y", "level_v": 0.25, "edge": "fall", "occurrence": 2}}],
    "swings": [{"net": "d_y", "low_v": 0.1, "high_v": 0.9}],
    "stop_s": 2.1e-9,
    "time_limit_s": 30.0})"));
}

TEST(JobJsonTest, AJobComesBackAsItWas) {
  const Job job = SomeJob();
  const Result<Job> back = JobFromJson(JobToJson(job));
  ASSERT_TRUE(back.ok()) << back.error().message;
  EXPECT_EQ(*back, job);
}

TEST(JobJsonTest, OutcomesComeBackToTheLastBit) {
  constexpr double kValues[] = {8.4777e-12,
                                -1.0 / 3.0,
                                std::numeric_limits<double>::denorm_min(),
                                std::numeric_limits<double>::max()};
  for (const Ending ending : {Ending::kMeasured,
                              Ending::kFailed,
                              Ending::kTimedOut,
                              Ending::kCrashed}) {
    for (const double value_s : kValues) {
      Outcome outcome;
      outcome.ending = ending;
      outcome.values_s = {{"delay", value_s}};
      outcome.message = "words";
      outcome.simulator_s = 0.015;
      const std::string text = OutcomeToJson(outcome).dump();
      const Result<Outcome> back = OutcomeFromJson(json::parse(text));
      ASSERT_TRUE(back.ok()) << back.error().message;
      EXPECT_EQ(back->ending, ending);
      EXPECT_EQ(back->values_s, outcome.values_s);
      EXPECT_EQ(back->message, outcome.message);
      EXPECT_EQ(back->simulator_s, outcome.simulator_s);
    }
  }
}

struct BadRow {
  std::string text;
  std::string message;
};

TEST(JobJsonTest, SaysWhichFieldIsWrong) {
  const BadRow rows[] = {
      {"{}",
       "not a job's outcome: [json.exception.out_of_range.403] key 'ending' "
       "not found"},
      {R"({"ending": "failed", "values_s": {}, "message": 3})",
       "not a job's outcome: [json.exception.type_error.302] type must be "
       "string, but is number"},
      {"[]",
       "not a job's outcome: [json.exception.type_error.304] cannot use at() "
       "with array"},
  };
  for (const BadRow& row : rows) {
    const Result<Outcome> outcome = OutcomeFromJson(json::parse(row.text));
    ASSERT_FALSE(outcome.ok()) << row.text;
    EXPECT_EQ(outcome.error().message, row.message);
  }
  EXPECT_FALSE(JobFromJson(json::parse(R"({"key": "k"})")).ok());
}

// An unknown word must not quietly become one of the known ones.
TEST(JobJsonTest, RefusesAnUnknownEndingOrEdge) {
  json outcome = OutcomeToJson(Outcome());
  outcome["ending"] = "exploded";
  EXPECT_EQ(OutcomeFromJson(outcome).error().message,
            "not a job's outcome: 'exploded' is none of its words");
  json job = JobToJson(SomeJob());
  job["intervals"][0]["to"]["edge"] = "sideways";
  EXPECT_EQ(JobFromJson(job).error().message,
            "not a job: 'sideways' is none of its words");
}

}  // namespace
}  // namespace gatedyno
