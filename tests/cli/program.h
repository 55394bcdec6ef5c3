// Runs the built program as a shell would.

#ifndef GATEDYNO_TESTS_CLI_PROGRAM_H_
#define GATEDYNO_TESTS_CLI_PROGRAM_H_

#include <filesystem>
#include <map>
#include <string>
#include <system_error>
#include <vector>

#include <boost/process.hpp>
#include <gtest/gtest.h>

#include "harness/base/file.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {

struct Ended {
  int exit_code = -1;
  std::string out;
  std::string err;
};

// A folder to work in, and the program.
class Program {
 public:
  explicit Program(std::string file = GATEDYNO_BIN_DIR "/gatedyno")
      : file_(std::move(file)) {}

  std::filesystem::path path() const { return folder_.path(); }

  // Makes the parent folders that are missing.
  std::string Write(const std::string& name, std::string_view text) const {
    const Status written = WriteFile(path() / name, text);
    EXPECT_TRUE(written.ok()) << written.error().message;
    return (path() / name).string();
  }

  std::string Read(const std::string& name) const {
    const Result<std::string> text = ReadFile(path() / name);
    EXPECT_TRUE(text.ok()) << text.error().message;
    return text.ok() ? *text : "";
  }

  // Standard output goes to the file `output` where one is named.
  Ended Run(const std::vector<std::string>& arguments,
            const std::string& output = "") const {
    namespace bp = boost::process;
    const TemporaryFolder streams;
    const std::string out = (streams.path() / "out").string();
    const std::string err = (streams.path() / "err").string();
    std::error_code failure;
    Ended ended;
    ended.exit_code = bp::system(
        file_,
        bp::args = arguments,
        bp::start_dir = path().string(),
        bp::std_in<bp::null, bp::std_out>(output.empty() ? out : output),
        bp::std_err > err,
        failure);
    EXPECT_FALSE(failure) << file_ << ": " << failure.message();
    ended.out = output.empty() ? *ReadFile(out) : "";
    ended.err = *ReadFile(err);
    return ended;
  }

 private:
  std::string file_;
  TemporaryFolder folder_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_CLI_PROGRAM_H_
