// What the data of every page is written with: short, since there is one set
// an arc.

#ifndef GATEDYNO_PAGE_DATA_JSON_H_
#define GATEDYNO_PAGE_DATA_JSON_H_

#include <cstddef>
#include <map>
#include <optional>
#include <string>

#include <nlohmann/json.hpp>

namespace gatedyno {

// Nine digits: far more than is measured, at half the size of all of them.
// Null for what is not finite, or not there.
nlohmann::json ShortNumber(double number);
nlohmann::json ShortNumber(const std::optional<double>& number);

// Gives each name the place at which it came first.
class NamePlaces {
 public:
  std::size_t Of(const std::string& name);
  const nlohmann::json& names() const { return names_; }

 private:
  std::map<std::string, std::size_t> places_;
  nlohmann::json names_ = nlohmann::json::array();
};

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_DATA_JSON_H_
