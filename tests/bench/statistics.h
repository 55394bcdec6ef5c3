// How far figures are from golden ones, and medians of repeated ones.

#ifndef GATEDYNO_TESTS_BENCH_STATISTICS_H_
#define GATEDYNO_TESTS_BENCH_STATISTICS_H_

#include <string>
#include <vector>

namespace gatedyno {

class RelativeErrors {
 public:
  void Add(const std::string& label, double value, double golden);
  // What gave no number where the others did.
  void AddMissing() { ++missing_; }

  int count() const { return count_; }
  int missing() const { return missing_; }
  double largest() const { return largest_; }  // Absolute.
  double rms() const;
  // "0.12 % largest, 0.04 % rms of 96 (nand2 a->y fall h=6)".
  std::string Text() const;

 private:
  int count_ = 0;
  int missing_ = 0;
  double squares_ = 0.0;
  double largest_ = 0.0;
  std::string worst_;
};

// REQUIRES: there are some.
double Median(std::vector<double> values);

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_BENCH_STATISTICS_H_
