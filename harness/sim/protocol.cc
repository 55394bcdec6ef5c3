#include "harness/sim/protocol.h"

#include <fmt/format.h>
#include <nlohmann/json.hpp>

#include "harness/record/job_json.h"
#include "harness/sim/frame.h"

namespace gatedyno {
namespace {

using nlohmann::json;

// A simulator may print any bytes, and JSON holds only UTF-8: what is not is
// replaced, since dump() would throw.
std::string Dump(const json& value) {
  return value.dump(-1, ' ', false, json::error_handler_t::replace);
}

Result<json> Parse(std::string_view text, std::string_view what) {
  json value = json::parse(text, nullptr, false);
  if (!value.is_object()) {
    constexpr size_t kShown = 40;
    return Internal(
        fmt::format("not a {}: '{}'", what, text.substr(0, kShown)));
  }
  return value;
}

}  // namespace

std::string HelloText(const Hello& hello) {
  return Dump({{"protocol", hello.protocol},
               {"worker", hello.worker},
               {"simulator", hello.simulator}});
}

Result<Hello> ParseHello(std::string_view text) {
  const Result<json> value = Parse(text, "hello");
  if (!value.ok()) {
    return Forward(value);
  }
  try {
    Hello hello;
    value->at("protocol").get_to(hello.protocol);
    if (hello.protocol != kProtocolVersion) {
      return Unavailable(fmt::format(
          "the worker speaks protocol {}, this program {}: install both "
          "programs from one build",
          hello.protocol,
          kProtocolVersion));
    }
    value->at("worker").get_to(hello.worker);
    value->at("simulator").get_to(hello.simulator);
    return hello;
  } catch (const json::exception& thrown) {
    return Internal(fmt::format("not a hello: {}", thrown.what()));
  }
}

Result<std::string> JobText(const Job& job) {
  std::string text = Dump(JobToJson(job));
  if (text.size() > kMaxFrameBytes) {
    return BadInput(fmt::format("the job is {} bytes long; the limit is {}",
                                text.size(),
                                kMaxFrameBytes));
  }
  return text;
}

Result<Job> ParseJob(std::string_view text) {
  const Result<json> value = Parse(text, "job");
  return value.ok() ? JobFromJson(*value) : Result<Job>(Forward(value));
}

std::string ReplyText(const Reply& reply) {
  std::string text = Dump(
      {{"outcome", OutcomeToJson(reply.outcome)}, {"leaving", reply.leaving}});
  if (text.size() <= kMaxFrameBytes || !reply.outcome.waves) {
    return text;
  }
  Reply refused;
  refused.outcome.ending = Ending::kFailed;
  refused.outcome.message =
      fmt::format("the waveforms are {} bytes long; the limit is {}",
                  text.size(),
                  kMaxFrameBytes);
  refused.outcome.simulator_s = reply.outcome.simulator_s;
  refused.leaving = reply.leaving;
  return ReplyText(refused);
}

Result<Reply> ParseReply(std::string_view text) {
  const Result<json> value = Parse(text, "reply");
  if (!value.ok()) {
    return Forward(value);
  }
  if (!value->contains("outcome")) {
    return Internal("not a reply: it holds no outcome");
  }
  Result<Outcome> outcome = OutcomeFromJson((*value)["outcome"]);
  if (!outcome.ok()) {
    return Forward(outcome);
  }
  const json leaving = value->value("leaving", json(false));
  return Reply{std::move(*outcome), leaving == json(true)};
}

}  // namespace gatedyno
