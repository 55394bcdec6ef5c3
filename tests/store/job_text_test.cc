#include "harness/store/job_text.h"

#include <gtest/gtest.h>

#include "tests/store/store_fixture.h"

namespace gatedyno {
namespace {

TEST(JobTextTest, TheMeasuresHoldAllButTheColumns) {
  const Job job = ExampleJob(4);
  const std::string text = MeasuresToText(job);
  EXPECT_EQ(text.find("nand2"), std::string::npos) << text;
  EXPECT_EQ(text.find("deck"), std::string::npos) << text;
  Job named;
  named.key = job.key;
  named.label = job.label;
  named.deck = job.deck;
  const Result<Job> back = JobFromText(named, text);
  ASSERT_TRUE(back.ok());
  EXPECT_EQ(*back, job);
}

TEST(JobTextTest, AMessageThatIsNotUtf8IsKept) {
  const Outcome outcome = EndedAs(Ending::kFailed, "singular matrix \xff at y");
  const Result<Outcome> back = OutcomeFromText(OutcomeToText(outcome));
  ASSERT_TRUE(back.ok());
  EXPECT_EQ(back->message, "singular matrix \xEF\xBF\xBD at y");
}

// Farm results are stores too, so this is the one way in.
TEST(JobTextTest, WavesAreNeverKept) {
  Job asking = ExampleJob(4);
  asking.wants_waves = true;
  EXPECT_EQ(MeasuresToText(asking), MeasuresToText(ExampleJob(4)));
  Outcome drawn = MeasuredAs(1e-12);
  drawn.waves = {{{"out", {0.0, 1e-12}, {0.0, 1.0}}}, {{"delay", 0.0, 1e-12}}};
  EXPECT_EQ(OutcomeToText(drawn), OutcomeToText(MeasuredAs(1e-12)));
}

TEST(JobTextTest, WhatIsNotJsonIsAnError) {
  for (const char* text : {"", "{", "[]", "7"}) {
    EXPECT_FALSE(OutcomeFromText(text).ok()) << text;
    EXPECT_FALSE(JobFromText(Job(), text).ok()) << text;
    EXPECT_FALSE(ProgressFromText(text).ok()) << text;
  }
}

}  // namespace
}  // namespace gatedyno
