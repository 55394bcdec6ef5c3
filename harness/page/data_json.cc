#include "harness/page/data_json.h"

#include <cmath>
#include <cstdlib>

#include <fmt/format.h>

namespace gatedyno {

using nlohmann::json;

json ShortNumber(double number) {
  if (!std::isfinite(number)) {
    return nullptr;
  }
  return std::strtod(fmt::format("{:.9g}", number).c_str(), nullptr);
}

json ShortNumber(const std::optional<double>& number) {
  return number ? ShortNumber(*number) : json(nullptr);
}

std::size_t NamePlaces::Of(const std::string& name) {
  const auto [place, fresh] = places_.try_emplace(name, names_.size());
  if (fresh) {
    names_.push_back(name);
  }
  return place->second;
}

}  // namespace gatedyno
