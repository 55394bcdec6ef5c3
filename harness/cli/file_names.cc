#include "harness/cli/file_names.h"

#include <algorithm>

#include <fmt/format.h>

#include "harness/base/text.h"

namespace gatedyno {
namespace {

constexpr std::string_view kHarmless =
    "abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789_-.+";
// Of the 255 bytes of most file systems; the rest is for a number, the
// extension and what is added while the file is written.
constexpr size_t kLongestStem = 200;

std::string Harmless(std::string_view stem) {
  std::string name(stem.substr(0, kLongestStem));
  std::replace_if(
      name.begin(),
      name.end(),
      [](char c) { return kHarmless.find(c) == std::string_view::npos; },
      '_');
  if (name.starts_with('.') || name.starts_with('-')) {
    name.front() = '_';
  }
  return name;
}

}  // namespace

std::string FileNames::FileName(std::string_view stem,
                                std::string_view extension) {
  const std::string harmless = Harmless(stem);
  std::string name = harmless;
  for (int next = 2; !given_.insert(ToLower(name)).second; ++next) {
    name = fmt::format("{}_{}", harmless, next);
  }
  return name += extension;
}

}  // namespace gatedyno
