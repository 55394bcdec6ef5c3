#include "harness/farm/round_folder.h"

#include <algorithm>
#include <array>
#include <charconv>
#include <optional>
#include <random>
#include <string_view>
#include <system_error>
#include <utility>

#include <fmt/format.h>
#include <unistd.h>

namespace gatedyno {
namespace {

constexpr std::string_view kRoundPrefix = "round-";
constexpr std::string_view kSharePrefix = "share-";
constexpr std::string_view kResultSuffix = ".result";
constexpr const char* kLogs = "logs";

tl::unexpected<Error> Refused(const std::filesystem::path& path,
                              std::string_view what,
                              const std::error_code& why) {
  return Unavailable(
      fmt::format("{}: {}: {}", path.string(), what, why.message()));
}

// "share-7.node7-4711-1.result" is of share 7.
std::optional<int> ShareOfResult(std::string_view name) {
  if (!name.starts_with(kSharePrefix) || !name.ends_with(kResultSuffix)) {
    return std::nullopt;
  }
  name.remove_prefix(kSharePrefix.size());
  int share = 0;
  const auto [end, failed] =
      std::from_chars(name.data(), name.data() + name.size(), share);
  return failed == std::errc() && *end == '.' ? std::optional(share)
                                              : std::nullopt;
}

std::string HostName() {
  std::array<char, 256> name{};
  return ::gethostname(name.data(), name.size() - 1) == 0 ? name.data()
                                                          : "host";
}

// The entries of `folder`, sorted by name.
Result<std::vector<std::filesystem::path>> List(
    const std::filesystem::path& folder) {
  std::error_code failed;
  std::vector<std::filesystem::path> entries;
  std::filesystem::directory_iterator entry(folder, failed);
  for (; !failed && entry != std::filesystem::directory_iterator();
       entry.increment(failed)) {
    entries.push_back(entry->path());
  }
  if (failed) {
    return Refused(folder, "cannot be listed", failed);
  }
  std::sort(entries.begin(), entries.end());
  return entries;
}

}  // namespace

Result<RoundFolder> RoundFolder::Make(const std::filesystem::path& farm) {
  std::error_code failed;
  std::filesystem::create_directories(farm / kLogs, failed);
  std::random_device chance;
  while (!failed) {
    RoundFolder round(farm, fmt::format("{}{:08x}", kRoundPrefix, chance()));
    if (std::filesystem::create_directory(round.path(), failed)) {
      return round;
    }
  }
  return Refused(farm, "the farm's folder cannot be written", failed);
}

Result<std::vector<RoundFolder>> RoundFolder::All(
    const std::filesystem::path& farm) {
  const auto entries = List(farm);
  if (!entries.ok()) {
    return Forward(entries);
  }
  std::vector<RoundFolder> rounds;
  for (const std::filesystem::path& entry : *entries) {
    const std::string name = entry.filename().string();
    if (name.starts_with(kRoundPrefix)) {
      rounds.emplace_back(farm, name);
    }
  }
  return rounds;
}

RoundFolder::RoundFolder(std::filesystem::path farm, std::string name)
    : farm_(std::move(farm)), name_(std::move(name)) {}

std::filesystem::path RoundFolder::ShareFile(int share) const {
  return path() / fmt::format("{}{}.jobs", kSharePrefix, share);
}

std::filesystem::path RoundFolder::NewResult(int share, int number) const {
  return path() / fmt::format("{}{}.{}-{}-{}{}",
                              kSharePrefix,
                              share,
                              HostName(),
                              ::getpid(),
                              number,
                              kResultSuffix);
}

Result<std::vector<ResultName>> RoundFolder::Results() const {
  const auto entries = List(path());
  if (!entries.ok()) {
    return Forward(entries);
  }
  std::vector<ResultName> results;
  for (const std::filesystem::path& entry : *entries) {
    if (const auto share = ShareOfResult(entry.filename().string())) {
      results.push_back({*share, entry});
    }
  }
  return results;
}

std::string RoundFolder::LogPattern() const {
  std::string folder;
  for (const char c : (farm_ / kLogs).string()) {
    folder += c == '%' ? "%%" : std::string(1, c);
  }
  return fmt::format("{}/{}-{}%a-%A.log", folder, name_, kSharePrefix);
}

std::filesystem::path RoundFolder::LogFile(int share,
                                           const std::string& array) const {
  return farm_ / kLogs /
         fmt::format("{}-{}{}-{}.log", name_, kSharePrefix, share, array);
}

void RoundFolder::RemoveLogs(int share) const {
  const std::string prefix =
      fmt::format("{}-{}{}-", name_, kSharePrefix, share);
  const auto logs = List(farm_ / kLogs);
  if (!logs.ok()) {
    return;
  }
  for (const std::filesystem::path& log : *logs) {
    if (log.filename().string().starts_with(prefix)) {
      std::error_code ignored;
      std::filesystem::remove(log, ignored);
    }
  }
}

Status RoundFolder::Remove() const {
  std::error_code failed;
  std::filesystem::remove_all(path(), failed);
  // A late task may be publishing there: then the next run removes it.
  if (failed && failed != std::errc::directory_not_empty) {
    return Refused(path(), "cannot be removed", failed);
  }
  return Ok();
}

}  // namespace gatedyno
