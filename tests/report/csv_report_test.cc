#include "harness/report/csv_report.h"

#include <cstdio>
#include <map>
#include <memory>
#include <string>
#include <string_view>
#include <vector>

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "tests/report/exempt_run.h"
#include "tests/report/sample_run.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using Rows = std::vector<std::vector<std::string>>;

// Reads RFC 4180 and nothing else: section 2, rules 1 to 7.
class CsvReader {
 public:
  explicit CsvReader(std::string_view text) : text_(text) {}

  Rows Read() {
    Rows rows;
    while (at_ < text_.size()) {
      std::vector<std::string> row = {Field()};
      while (Take(",")) {
        row.push_back(Field());
      }
      EXPECT_TRUE(Take("\r\n")) << "at byte " << at_;
      if (testing::Test::HasFailure()) {
        break;
      }
      rows.push_back(row);
    }
    return rows;
  }

 private:
  bool Take(std::string_view expected) {
    const bool found = text_.substr(at_).starts_with(expected);
    at_ += found ? expected.size() : 0;
    return found;
  }

  std::string Field() { return Take("\"") ? Quoted() : Bare(); }

  std::string Bare() {
    const size_t end = text_.find_first_of(",\r\n\"", at_);
    const size_t begin = at_;
    at_ = std::min(end, text_.size());
    return std::string(text_.substr(begin, at_ - begin));
  }

  std::string Quoted() {
    std::string field;
    while (at_ < text_.size()) {
      if (Take("\"\"")) {
        field += '"';
      } else if (Take("\"")) {
        return field;
      } else {
        field += text_[at_++];
      }
    }
    ADD_FAILURE() << "an open quote";
    return field;
  }

  std::string_view text_;
  size_t at_ = 0;
};

RunResult RunWithHostileTexts() {
  RunResult result = SampleRun();
  result.comparisons[0].arc.cell = "in,v \"x\"";
  result.comparisons[1].reason = "two\r\nlines, and \"quotes\"";
  result.comparisons[2].arc.pin = "a<0>";
  return result;
}

// Field by name of one row.
std::string At(const Rows& rows, size_t row, const std::string& column) {
  for (size_t i = 0; i < rows[0].size(); ++i) {
    if (rows[0][i] == column) {
      return rows[row][i];
    }
  }
  ADD_FAILURE() << "no column " << column;
  return "";
}

TEST(CsvReportTest, ReadsBack) {
  const RunResult result = RunWithHostileTexts();
  const std::string text = CsvReport(result, kToday);
  const Rows rows = CsvReader(text).Read();
  ASSERT_EQ(rows.size(), result.comparisons.size() + 1);
  for (size_t i = 1; i < rows.size(); ++i) {
    const Comparison& row = result.comparisons[i - 1];
    ASSERT_EQ(rows[i].size(), rows[0].size()) << i;
    EXPECT_EQ(At(rows, i, "corner"), row.corner);
    EXPECT_EQ(At(rows, i, "cell"), row.arc.cell);
    EXPECT_EQ(At(rows, i, "pin"), row.arc.pin);
    EXPECT_EQ(At(rows, i, "side"), DescribeSide(row.arc));
    EXPECT_EQ(At(rows, i, "edge"), EdgeName(row.arc.edge));
    EXPECT_EQ(At(rows, i, "reason"), row.reason);
    EXPECT_EQ(At(rows, i, "verdict"), VerdictName(row.verdict));
    EXPECT_EQ(At(rows, i, "bent"), row.bent ? "yes" : "no");
    // All digits: the very number comes back.
    EXPECT_EQ(std::stod(At(rows, i, "g_hand")), row.estimate.effort);
    EXPECT_EQ(std::stod(At(rows, i, "p_hand_elmore")),
              row.estimate.parasitic_by_elmore);
    if (row.line) {
      EXPECT_EQ(std::stod(At(rows, i, "g")), row.effort.value);
      EXPECT_EQ(std::stod(At(rows, i, "g_u")), row.effort.u);
      EXPECT_EQ(std::stod(At(rows, i, "p_difference")),
                row.parasitic_difference);
      EXPECT_EQ(std::stod(At(rows, i, "slope_s")), row.line->slope_s);
    }
  }
}

TEST(CsvReportTest, LeavesEmptyWhatWasNotMeasured) {
  const Rows rows = CsvReader(CsvReport(SampleRun(), kToday)).Read();
  constexpr size_t kUnmeasured = 4;
  for (const char* column : {"g",
                             "g_u",
                             "g_mean_tau",
                             "g_difference",
                             "p_hand_tau",
                             "p",
                             "p_u",
                             "p_difference",
                             "slope_s",
                             "intercept_s",
                             "largest_residual_s"}) {
    EXPECT_EQ(At(rows, kUnmeasured, column), "") << column;
    EXPECT_NE(At(rows, 1, column), "") << column;
  }
  EXPECT_EQ(At(rows, kUnmeasured, "verdict"), "not measured");
}

TEST(CsvReportTest, AnUnknownUncertaintyIsEmpty) {
  RunResult result = SampleRun();
  result.comparisons[0].effort.u.reset();
  const Rows rows = CsvReader(CsvReport(result, kToday)).Read();
  EXPECT_EQ(At(rows, 1, "g_u"), "");
}

std::string OutputOf(const std::string& command) {
  const std::unique_ptr<FILE, int (*)(FILE*)> pipe(
      ::popen(command.c_str(), "r"), &::pclose);
  std::string output;
  for (int c = std::fgetc(pipe.get()); c != EOF; c = std::fgetc(pipe.get())) {
    output += static_cast<char>(c);
  }
  return output;
}

// Another reader than ours.
TEST(CsvReportTest, PythonReadsTheSame) {
  TemporaryFolder folder;
  const std::string text = CsvReport(RunWithHostileTexts(), kToday);
  const std::string file = folder.Write("t.csv", text).string();
  const std::string script =
      folder
          .Write("read.py",
                 "import csv, json, sys\n"
                 "rows = csv.reader(open(sys.argv[1], newline=''), "
                 "strict=True)\n"
                 "print(json.dumps(list(rows)))\n")
          .string();
  const std::string output =
      OutputOf("python3 " + script + " " + file + " 2>/dev/null");
  if (output.empty()) {
    GTEST_SKIP() << "python3 is not installed";
  }
  EXPECT_EQ(nlohmann::json::parse(output).get<Rows>(), CsvReader(text).Read());
}

TEST(CsvReportTest, SaysWhatIsExempt) {
  const Rows rows = CsvReader(CsvReport(ExemptRun(), kToday)).Read();
  constexpr size_t kWithin = 1;
  constexpr size_t kUnmeasured = 4;
  constexpr size_t kBeyond = 5;
  EXPECT_EQ(At(rows, kWithin, "excused"), "no");
  EXPECT_EQ(At(rows, kWithin, "exemption"), "");
  EXPECT_EQ(At(rows, kUnmeasured, "excused"), "no");
  EXPECT_EQ(At(rows, kUnmeasured, "exemption"), kExpiredNote);
  EXPECT_EQ(At(rows, kBeyond, "excused"), "yes");
  EXPECT_EQ(At(rows, kBeyond, "exemption"), kExemptNote);
  EXPECT_EQ(At(rows, kBeyond, "verdict"), "beyond");
}

}  // namespace
}  // namespace gatedyno
