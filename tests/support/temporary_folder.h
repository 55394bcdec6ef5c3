// A folder that goes with the test.

#ifndef GATEDYNO_TESTS_SUPPORT_TEMPORARY_FOLDER_H_
#define GATEDYNO_TESTS_SUPPORT_TEMPORARY_FOLDER_H_

#include <cstdlib>
#include <filesystem>
#include <fstream>
#include <string>
#include <string_view>

namespace gatedyno {

class TemporaryFolder {
 public:
  TemporaryFolder()
      : path_((std::filesystem::temp_directory_path() / "gatedyno-test-XXXXXX")
                  .string()) {
    if (::mkdtemp(path_.data()) == nullptr) {
      std::abort();
    }
  }
  ~TemporaryFolder() {
    std::error_code ignored;
    std::filesystem::remove_all(path_, ignored);
  }
  TemporaryFolder(const TemporaryFolder&) = delete;
  TemporaryFolder& operator=(const TemporaryFolder&) = delete;

  std::filesystem::path path() const { return path_; }

  std::filesystem::path Write(std::string_view name, std::string_view text) {
    std::filesystem::path file = path() / name;
    std::ofstream(file) << text;
    return file;
  }

  // A shell script that can be run as a program.
  std::filesystem::path WriteScript(std::string_view name,
                                    std::string_view body) {
    std::filesystem::path file = Write(name, "#!/bin/sh\n" + std::string(body));
    std::filesystem::permissions(file, std::filesystem::perms::owner_all);
    return file;
  }

 private:
  std::string path_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_SUPPORT_TEMPORARY_FOLDER_H_
