// Where the program finds what was installed with it: PREFIX/bin holds the
// programs, PREFIX/share/gatedyno the nodes, cells and plans.  A build tree has
// the same shape, so nothing depends on where it was built.

#ifndef GATEDYNO_BASE_INSTALL_H_
#define GATEDYNO_BASE_INSTALL_H_

#include <filesystem>

namespace gatedyno {

// Folder of the running executable.
std::filesystem::path ProgramFolder();
// The node descriptions (*.json) and their cards.
std::filesystem::path ModelsFolder();
// cells/ and plans/.
std::filesystem::path DecksFolder();
// The worker program.
std::filesystem::path WorkerProgram();

}  // namespace gatedyno

#endif  // GATEDYNO_BASE_INSTALL_H_
