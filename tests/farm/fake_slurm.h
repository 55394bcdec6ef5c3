// Puts a Slurm of one script (tests/support/fake-slurm.sh) first on PATH.

#ifndef GATEDYNO_TESTS_FARM_FAKE_SLURM_H_
#define GATEDYNO_TESTS_FARM_FAKE_SLURM_H_

#include <csignal>
#include <cstdlib>
#include <filesystem>
#include <fstream>
#include <string>
#include <vector>

#include <fmt/format.h>
#include <sys/types.h>

#include "tests/support/temporary_folder.h"

namespace gatedyno {

class FakeSlurm {
 public:
  FakeSlurm() : path_before_(std::getenv("PATH")) {
    const std::filesystem::path bin = folder_.path() / "bin";
    std::filesystem::create_directory(bin);
    for (const char* command : {"scontrol", "sbatch", "squeue", "scancel"}) {
      std::filesystem::create_symlink(
          GATEDYNO_SOURCE_DIR "/tests/support/fake-slurm.sh", bin / command);
    }
    for (const char* part : {"queue", "lies"}) {
      std::filesystem::create_directory(folder_.path() / part);
    }
    ::setenv("PATH", (bin.string() + ":" + path_before_).c_str(), 1);
    ::setenv("FAKE_SLURM", folder_.path().c_str(), 1);
  }
  ~FakeSlurm() {
    for (const pid_t task : Tasks()) {
      ::kill(task, SIGKILL);
    }
    ::setenv("PATH", path_before_.c_str(), 1);
  }
  FakeSlurm(const FakeSlurm&) = delete;
  FakeSlurm& operator=(const FakeSlurm&) = delete;

  void Lie(const std::string& lie, int times) {
    folder_.Write("lies/" + lie, fmt::format("{}\n", times));
  }
  void SetMaxArraySize(int size) {
    folder_.Write("max-array", fmt::format("{}\n", size));
  }

  int arrays_submitted() const {
    int last = 0;
    std::ifstream(folder_.path() / "last") >> last;
    return last;
  }
  std::vector<std::string> Arguments(int array) const {
    std::ifstream in(folder_.path() / fmt::format("arguments-{}", array));
    std::vector<std::string> arguments;
    for (std::string line; std::getline(in, line);) {
      arguments.push_back(line);
    }
    return arguments;
  }

  // Processes of tasks that were started and still run.
  std::vector<pid_t> Tasks() const {
    std::vector<pid_t> tasks;
    for (const auto& entry :
         std::filesystem::directory_iterator(folder_.path() / "queue")) {
      pid_t task = 0;
      std::ifstream(entry.path()) >> task;
      if (task > 0 && Runs(task)) {
        tasks.push_back(task);
      }
    }
    return tasks;
  }

 private:
  // The number may have been given to another program since.
  static bool Runs(pid_t task) {
    std::ifstream in(fmt::format("/proc/{}/cmdline", task));
    const std::string line((std::istreambuf_iterator<char>(in)), {});
    return line.find("round-") != std::string::npos;
  }

  TemporaryFolder folder_;
  std::string path_before_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_FARM_FAKE_SLURM_H_
