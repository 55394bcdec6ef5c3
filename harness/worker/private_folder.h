// Works in an empty folder of its own for as long as one lives.
//
// ngspice reads .spiceinit from the working folder or else from the home
// folder.  An empty one in a private folder is found first.

#ifndef GATEDYNO_WORKER_PRIVATE_FOLDER_H_
#define GATEDYNO_WORKER_PRIVATE_FOLDER_H_

#include <filesystem>

#include "harness/base/result.h"
#include "harness/base/scratch_folder.h"

namespace gatedyno {

class PrivateFolder {
 public:
  // Makes the folder, with an empty .spiceinit, and changes into it.
  static Result<PrivateFolder> Enter();

  // Changes back and removes it.
  ~PrivateFolder();
  PrivateFolder(PrivateFolder&& other) noexcept = default;
  PrivateFolder& operator=(PrivateFolder&&) = delete;

 private:
  PrivateFolder(ScratchFolder folder, std::filesystem::path before);

  ScratchFolder folder_;
  std::filesystem::path before_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_WORKER_PRIVATE_FOLDER_H_
