#include "harness/sim/protocol.h"

#include <string>

#include <gtest/gtest.h>

#include "harness/sim/frame.h"

namespace gatedyno {
namespace {

Job SomeJob() {
  Job job;
  job.key = "0123";
  job.label = "nand2 a->y h=4 typical";
  job.deck = "a deck\n.end\n";
  job.settings = {".options reltol=0.001\n"};
  job.intervals = {
      {"delay", {"in", 0.5, Edge::kRise, 1}, {"out", 0.25, Edge::kFall, 2}}};
  job.swings = {{"out", 0.1, 0.9}};
  job.stop_s = 2.1e-9;
  job.time_limit_s = 30.0;
  return job;
}

TEST(ProtocolTest, AJobComesBackAsItWas) {
  const Job job = SomeJob();
  const Result<std::string> text = JobText(job);
  ASSERT_TRUE(text.ok());
  const Result<Job> back = ParseJob(*text);
  ASSERT_TRUE(back.ok());
  EXPECT_EQ(*back, job);
}

TEST(ProtocolTest, AReplyComesBackToTheLastBit) {
  Reply reply;
  reply.outcome.ending = Ending::kMeasured;
  reply.outcome.values_s = {{"delay", 0.1 + 0.2}, {"skew", -1e-15 / 3.0}};
  reply.outcome.simulator_s = 0.0123;
  reply.leaving = true;
  const Result<Reply> back = ParseReply(ReplyText(reply));
  ASSERT_TRUE(back.ok());
  EXPECT_EQ(back->outcome.ending, Ending::kMeasured);
  EXPECT_EQ(back->outcome.values_s, reply.outcome.values_s);
  EXPECT_EQ(back->outcome.simulator_s, reply.outcome.simulator_s);
  EXPECT_TRUE(back->leaving);
}

TEST(ProtocolTest, WavesComeBackToTheLastBit) {
  Reply reply;
  reply.outcome.ending = Ending::kMeasured;
  reply.outcome.waves = {{{"out", {0.0, 1e-12 / 3.0}, {0.1 + 0.2, -1e-9}}},
                         {{"delay", 1e-13, 2e-13}}};
  const Result<Reply> back = ParseReply(ReplyText(reply));
  ASSERT_TRUE(back.ok());
  EXPECT_EQ(back->outcome.waves, reply.outcome.waves);
}

TEST(ProtocolTest, WavesThatNoFrameCanHoldAreAFailureInWords) {
  Reply reply;
  reply.outcome.ending = Ending::kMeasured;
  reply.outcome.values_s = {{"delay", 1e-12}};
  reply.outcome.simulator_s = 0.25;
  reply.outcome.waves = {{{std::string(kMaxFrameBytes, 'n'), {0.0}, {0.0}}},
                         {}};
  reply.leaving = true;
  const std::string text = ReplyText(reply);
  ASSERT_LE(text.size(), kMaxFrameBytes);
  const Result<Reply> back = ParseReply(text);
  ASSERT_TRUE(back.ok());
  EXPECT_EQ(back->outcome.ending, Ending::kFailed);
  EXPECT_EQ(back->outcome.message,
            "the waveforms are 67109063 bytes long; the limit is 67108864");
  EXPECT_EQ(back->outcome.simulator_s, 0.25);
  EXPECT_TRUE(back->leaving);
}

TEST(ProtocolTest, BytesThatAreNoTextDoNotStopAReply) {
  Reply reply;
  reply.outcome.message = "caf\xe9 not found";
  const Result<Reply> back = ParseReply(ReplyText(reply));
  ASSERT_TRUE(back.ok());
  EXPECT_EQ(back->outcome.message, "caf\xef\xbf\xbd not found");
}

TEST(ProtocolTest, RefusesAJobNoFrameCanHold) {
  Job job;
  job.deck = std::string(kMaxFrameBytes, '*');
  const Result<std::string> text = JobText(job);
  ASSERT_FALSE(text.ok());
  EXPECT_EQ(text.error().message,
            "the job is 67108969 bytes long; the limit is 67108864");
}

struct BadHelloRow {
  std::string text;
  std::string message;
};

TEST(ProtocolTest, RefusesWhatIsNoHello) {
  const BadHelloRow rows[] = {
      {"ngspice", "not a hello: 'ngspice'"},
      {"[1]", "not a hello: '[1]'"},
      {R"({"protocol": 99})",
       "the worker speaks protocol 99, this program 2: install both programs "
       "from one build"},
      {R"({"worker": "0.1.0"})",
       "not a hello: [json.exception.out_of_range.403] key 'protocol' not "
       "found"},
  };
  for (const BadHelloRow& row : rows) {
    const Result<Hello> hello = ParseHello(row.text);
    ASSERT_FALSE(hello.ok()) << row.text;
    EXPECT_EQ(hello.error().message, row.message);
  }
}

TEST(ProtocolTest, AHelloComesBackAsItWas) {
  const Hello hello = {kProtocolVersion, "0.1.0", "ngspice-39"};
  const Result<Hello> back = ParseHello(HelloText(hello));
  ASSERT_TRUE(back.ok());
  EXPECT_EQ(*back, hello);
}

TEST(ProtocolTest, RefusesWhatIsNoReply) {
  EXPECT_EQ(ParseReply("}{").error().message, "not a reply: '}{'");
  EXPECT_EQ(ParseReply("{}").error().message,
            "not a reply: it holds no outcome");
  EXPECT_FALSE(ParseReply(R"({"outcome": 3})").ok());
  EXPECT_FALSE(ParseJob(R"({"deck": 3})").ok());
}

}  // namespace
}  // namespace gatedyno
