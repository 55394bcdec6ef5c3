#include "harness/farm/array_indices.h"

#include <cstddef>

#include <fmt/format.h>

namespace gatedyno {

std::string ArrayIndices(std::span<const int> indices) {
  std::string text;
  for (size_t i = 0; i < indices.size();) {
    const int first = indices[i];
    int last = first;
    for (++i; i < indices.size() && indices[i] == last + 1; ++i) {
      last = indices[i];
    }
    text += text.empty() ? "" : ",";
    text += first == last ? fmt::format("{}", first)
                          : fmt::format("{}-{}", first, last);
  }
  return text;
}

}  // namespace gatedyno
