// Where the kit's files are.

#ifndef GATEDYNO_TESTS_KIT_KIT_FOLDER_H_
#define GATEDYNO_TESTS_KIT_KIT_FOLDER_H_

#include <filesystem>
#include <string>

namespace gatedyno {

inline std::filesystem::path KitFile(const std::string& name) {
  return std::filesystem::path(KIT_DIR) / name;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_KIT_KIT_FOLDER_H_
