#include "harness/network/cell_error.h"

#include <fmt/format.h>

namespace gatedyno {

tl::unexpected<Error> CellError(const Cell& cell, std::string_view message) {
  return CellErrorAt(cell, cell.place, message);
}

tl::unexpected<Error> CellErrorAt(const Cell& cell,
                                  const SourcePlace& place,
                                  std::string_view message) {
  return BadInput(fmt::format("{}:{}:{}: cell '{}': {}",
                              place.file,
                              place.line,
                              place.column,
                              cell.name,
                              message));
}

}  // namespace gatedyno
