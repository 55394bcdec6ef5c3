#include "harness/base/install.h"

#include <system_error>

namespace gatedyno {

std::filesystem::path ProgramFolder() {
  std::error_code failed;
  const auto program = std::filesystem::read_symlink("/proc/self/exe", failed);
  return failed ? std::filesystem::path(".") : program.parent_path();
}

std::filesystem::path ModelsFolder() {
  return ProgramFolder().parent_path() / "share/gatedyno/models";
}

std::filesystem::path DecksFolder() {
  return ProgramFolder().parent_path() / "share/gatedyno/decks";
}

std::filesystem::path WorkerProgram() {
  return ProgramFolder() / "gatedyno-worker";
}

}  // namespace gatedyno
