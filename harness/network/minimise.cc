#include "harness/network/minimise.h"

#include <algorithm>
#include <bit>
#include <set>

namespace gatedyno {
namespace {

std::vector<InputVector> RowsOf(const TruthTable& table) {
  std::vector<InputVector> rows;
  for (InputVector v = 0; v < table.rows(); ++v) {
    if (table.at(v)) {
      rows.push_back(v);
    }
  }
  return rows;
}

// Products with one free input more; those that merge with none are prime.
std::set<Product> MergePairs(int inputs,
                             const std::set<Product>& products,
                             std::vector<Product>& primes) {
  std::set<Product> merged;
  for (const Product& product : products) {
    bool is_prime = true;
    for (int i = 0; i < inputs; ++i) {
      const InputVector bit = InputVector{1} << i;
      if ((product.free & bit) == 0 &&
          products.contains({product.value ^ bit, product.free})) {
        merged.insert({product.value & ~bit, product.free | bit});
        is_prime = false;
      }
    }
    if (is_prime) {
      primes.push_back(product);
    }
  }
  return merged;
}

// The only prime that covers some row, for every such row.
std::vector<Product> Essentials(const std::vector<Product>& primes,
                                const std::vector<InputVector>& rows) {
  std::set<Product> essential;
  for (const InputVector row : rows) {
    const auto covers = [&](const Product& prime) { return prime.covers(row); };
    const auto first = std::find_if(primes.begin(), primes.end(), covers);
    if (std::find_if(first + 1, primes.end(), covers) == primes.end()) {
      essential.insert(*first);
    }
  }
  return {essential.begin(), essential.end()};
}

void DropCovered(std::vector<InputVector>& rows, const Product& product) {
  std::erase_if(rows, [&](InputVector row) { return product.covers(row); });
}

}  // namespace

std::vector<Product> PrimeImplicants(const TruthTable& table) {
  std::set<Product> products;
  for (const InputVector row : RowsOf(table)) {
    products.insert({row, 0});
  }
  std::vector<Product> primes;
  while (!products.empty()) {
    products = MergePairs(table.inputs, products, primes);
  }
  return primes;
}

std::vector<Product> MinimalCover(const TruthTable& table) {
  const std::vector<Product> primes = PrimeImplicants(table);
  std::vector<InputVector> rows = RowsOf(table);
  std::vector<Product> cover = Essentials(primes, rows);
  for (const Product& product : cover) {
    DropCovered(rows, product);
  }
  while (!rows.empty()) {
    // The most rows; of equals the one with the fewest pins.
    const auto worth = [&](const Product& prime) {
      const auto covered =
          std::count_if(rows.begin(), rows.end(), [&](InputVector row) {
            return prime.covers(row);
          });
      return std::pair(covered, std::popcount(prime.free));
    };
    const Product best = *std::max_element(
        primes.begin(), primes.end(), [&](const Product& a, const Product& b) {
          return worth(a) < worth(b);
        });
    cover.push_back(best);
    DropCovered(rows, best);
  }
  return cover;
}

}  // namespace gatedyno
