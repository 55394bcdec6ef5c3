// How often a text stands in another.

#ifndef GATEDYNO_TESTS_PAGE_COUNT_H_
#define GATEDYNO_TESTS_PAGE_COUNT_H_

#include <cstddef>
#include <string>

namespace gatedyno {

inline std::size_t Count(const std::string& text, const std::string& what) {
  std::size_t count = 0;
  for (std::size_t at = text.find(what); at != std::string::npos;
       at = text.find(what, at + 1)) {
    ++count;
  }
  return count;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_PAGE_COUNT_H_
