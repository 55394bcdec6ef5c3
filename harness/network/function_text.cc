#include "harness/network/function_text.h"

#include <algorithm>
#include <bit>
#include <optional>

#include "harness/network/boolean_expression.h"
#include "harness/network/minimise.h"
#include "harness/network/series_parallel.h"

namespace gatedyno {
namespace {

using Operator = BooleanExpression::Operator;

// Up to here both the function and its complement are minimised; beyond, the
// one with fewer rows, to bound the number of products (3^inputs).
constexpr int kBothWaysInputs = 6;

class NetworkFunctions {
 public:
  NetworkFunctions(const Cell& cell, const NetworkAnalysis& analysis)
      : cell_(cell), analysis_(analysis) {}

  // The networks' own expression; none where one is not series/parallel.
  // NOLINTNEXTLINE(misc-no-recursion): as deep as the cell has stages.
  std::optional<BooleanExpression> Of(NetId net) const {
    const auto& inputs = analysis_.inputs;
    if (std::find(inputs.begin(), inputs.end(), net) != inputs.end()) {
      return Name(cell_.net_name(net));
    }
    if (analysis_.network.is_supply(net)) {
      return Name(net == analysis_.network.power ? "1" : "0");
    }
    const auto tree =
        ReduceSeriesParallel(analysis_.network,
                             FindRailNetwork(analysis_.network,
                                             analysis_.group_of(net),
                                             net,
                                             analysis_.network.ground));
    auto pull_down = tree ? Conduction(*tree) : std::nullopt;
    if (!pull_down) {
      return std::nullopt;
    }
    return Not(std::move(*pull_down));
  }

 private:
  // When the network conducts.
  // NOLINTNEXTLINE(misc-no-recursion): as deep as the tree.
  std::optional<BooleanExpression> Conduction(
      const SeriesParallel& tree) const {
    if (tree.form == SeriesParallel::Form::kDevice) {
      const Switch& device =
          analysis_.network.switches[static_cast<size_t>(tree.index)];
      auto gate = Of(device.gate);
      return gate && device.polarity == Polarity::kP ? Not(std::move(*gate))
                                                     : gate;
    }
    std::vector<BooleanExpression> terms;
    for (const SeriesParallel& part : tree.parts) {
      auto term = Conduction(part);
      if (!term) {
        return std::nullopt;
      }
      terms.push_back(std::move(*term));
    }
    return Combine(tree.form == SeriesParallel::Form::kSeries ? Operator::kAnd
                                                              : Operator::kOr,
                   std::move(terms));
  }

  const Cell& cell_;
  const NetworkAnalysis& analysis_;
};

using Names = std::vector<std::string>;

BooleanExpression ProductOf(const Product& product, const Names& names) {
  std::vector<BooleanExpression> terms;
  for (size_t i = 0; i < names.size(); ++i) {
    const int input = static_cast<int>(i);
    if (!IsHigh(product.free, input)) {
      terms.push_back(IsHigh(product.value, input) ? Name(names[i])
                                                   : Not(Name(names[i])));
    }
  }
  return Combine(Operator::kAnd, std::move(terms));
}

BooleanExpression SumOfProducts(const TruthTable& table, const Names& names) {
  std::vector<BooleanExpression> products;
  for (const Product& product : MinimalCover(table)) {
    products.push_back(ProductOf(product, names));
  }
  return Combine(Operator::kOr, std::move(products));
}

// The function as an exclusive or of its inputs, if it is one.
std::optional<BooleanExpression> ExclusiveOr(const TruthTable& table,
                                             const Names& names) {
  InputVector mask = 0;
  std::vector<BooleanExpression> terms;
  for (int i = 0; i < table.inputs; ++i) {
    if (DependsOn(table, i)) {
      mask |= InputVector{1} << i;
      terms.push_back(Name(names[static_cast<size_t>(i)]));
    }
  }
  for (InputVector v = 0; v < table.rows(); ++v) {
    const bool odd = std::popcount(v & mask) % 2 != 0;
    if ((table.at(v) != table.at(0)) != odd) {
      return std::nullopt;
    }
  }
  BooleanExpression parity = Combine(Operator::kXor, std::move(terms));
  return table.at(0) ? Not(std::move(parity)) : std::move(parity);
}

std::vector<BooleanExpression> Minimised(const TruthTable& table,
                                         const Names& names) {
  const auto rows = static_cast<size_t>(table.rows());
  const bool both = table.inputs <= kBothWaysInputs;
  std::vector<BooleanExpression> found;
  if (both || 2 * table.high.count() <= rows) {
    found.push_back(SumOfProducts(table, names));
  }
  if (both || 2 * table.high.count() > rows) {
    found.push_back(Not(SumOfProducts(Complement(table), names)));
  }
  return found;
}

}  // namespace

std::string FunctionText(const Cell& cell,
                         const NetworkAnalysis& analysis,
                         NetId net) {
  const TruthTable table = analysis.function_of(net);
  if (table.high.none() || table.high.count() == table.rows()) {
    return table.high.none() ? "0" : "1";
  }
  Names names;
  for (const NetId input : analysis.inputs) {
    names.push_back(cell.net_name(input));
  }
  std::vector<BooleanExpression> candidates;
  if (auto parity = ExclusiveOr(table, names)) {
    candidates.push_back(std::move(*parity));
  }
  if (auto drawn = NetworkFunctions(cell, analysis).Of(net)) {
    candidates.push_back(std::move(*drawn));
  }
  for (BooleanExpression& minimised : Minimised(table, names)) {
    candidates.push_back(std::move(minimised));
  }
  const auto cost = [](const BooleanExpression& expression) {
    return std::pair(CountNames(expression), CountNots(expression));
  };
  BooleanExpression best = *std::min_element(
      candidates.begin(),
      candidates.end(),
      [&](const BooleanExpression& a, const BooleanExpression& b) {
        return cost(a) < cost(b);
      });
  SortTerms(best, names);
  return ToText(best);
}

}  // namespace gatedyno
