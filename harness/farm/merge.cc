#include "harness/farm/merge.h"

#include <optional>
#include <system_error>
#include <utility>

#include "harness/farm/result_file.h"
#include "harness/farm/share_file.h"

namespace gatedyno {
namespace {

void SetAside(const std::filesystem::path& result) {
  std::error_code ignored;
  std::filesystem::rename(result, result.string() + ".spoilt", ignored);
}

// A result that can be asked; its path for when it turns out that it cannot.
struct Source {
  std::filesystem::path path;
  ResultReader reader;
  bool spoilt = false;
};

Result<std::vector<Source>> OpenAll(
    std::span<const std::filesystem::path> results) {
  std::vector<Source> sources;
  for (const std::filesystem::path& path : results) {
    Result<ResultReader> reader = ResultReader::Open(path);
    if (reader.ok()) {
      sources.push_back({path, std::move(*reader)});
    } else if (reader.error().kind == ErrorKind::kBadInput) {
      SetAside(path);
    } else {
      return Forward(reader);
    }
  }
  return sources;
}

std::optional<Outcome> FindIn(std::vector<Source>* sources,
                              const std::string& key) {
  for (Source& source : *sources) {
    if (source.spoilt) {
      continue;
    }
    Result<std::optional<Outcome>> found = source.reader.Find(key);
    if (!found.ok()) {
      source.spoilt = true;
      SetAside(source.path);
    } else if (found->has_value()) {
      return std::move(*found);
    }
  }
  return std::nullopt;
}

}  // namespace

Result<size_t> MergeShare(const std::filesystem::path& share,
                          std::span<const std::filesystem::path> results,
                          const SimRunner::OnOutcome& on_outcome,
                          std::vector<bool>* delivered) {
  Result<std::vector<Source>> sources = OpenAll(results);
  if (!sources.ok()) {
    return Forward(sources);
  }
  Result<ShareReader> jobs = ShareReader::Open(share);
  if (!jobs.ok()) {
    return Forward(jobs);
  }
  size_t count = 0;
  for (size_t i = 0;; ++i) {
    const Result<std::optional<Job>> job = jobs->Next();
    if (!job.ok()) {
      return Forward(job);
    }
    if (!job->has_value()) {
      return count;
    }
    if (i >= delivered->size()) {
      delivered->push_back(false);
    }
    const auto outcome =
        (*delivered)[i] ? std::nullopt : FindIn(&*sources, (*job)->key);
    if (outcome) {
      if (const Status taken = on_outcome(**job, *outcome); !taken.ok()) {
        return Forward(taken);
      }
      (*delivered)[i] = true;
      ++count;
    }
  }
}

}  // namespace gatedyno
