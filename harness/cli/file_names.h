// File names made of names from netlists, which may hold anything.

#ifndef GATEDYNO_CLI_FILE_NAMES_H_
#define GATEDYNO_CLI_FILE_NAMES_H_

#include <set>
#include <string>
#include <string_view>

namespace gatedyno {

// Names within one folder, each given once.
class FileNames {
 public:
  // `stem` with every character but letters, digits and _-.+ replaced by '_',
  // shortened to what any file system takes, and followed by a number where it
  // would be the name of an earlier file.  Never begins with '.' or '-'.
  std::string FileName(std::string_view stem, std::string_view extension);

 private:
  std::set<std::string> given_;  // In lower case: some folders ignore it.
};

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_FILE_NAMES_H_
