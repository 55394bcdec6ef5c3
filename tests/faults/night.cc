#include "tests/faults/night.h"

#include <cctype>
#include <csignal>
#include <fstream>
#include <limits>
#include <sstream>

#include <gtest/gtest.h>
#include <sys/wait.h>

#include "harness/base/file.h"
#include "harness/store/store.h"

namespace gatedyno {
namespace {

namespace bp = boost::process;
namespace fs = std::filesystem;

// Some seconds on two processors: 18 corners of three cells.
const std::vector<std::string>& PlanArguments() {
  static const auto& arguments = *new std::vector<std::string>{"run",
                                                               "inv",
                                                               "nand2",
                                                               "nor2",
                                                               "--corner",
                                                               "slow_*",
                                                               "--corner",
                                                               "fast_*"};
  return arguments;
}

std::vector<std::string> ArgumentsFor(const fs::path& store,
                                      const std::vector<std::string>& more) {
  std::vector<std::string> arguments = PlanArguments();
  arguments.insert(arguments.end(), {"--store", store.string()});
  arguments.insert(arguments.end(), more.begin(), more.end());
  return arguments;
}

// "PID (name) state parent ...".
pid_t ParentOf(const fs::path& process) {
  std::ifstream stat(process / "stat");
  std::string text;
  std::getline(stat, text);
  const size_t name_end = text.rfind(')');
  if (name_end == std::string::npos) {
    return 0;
  }
  std::istringstream rest(text.substr(name_end + 1));
  char state = '\0';
  pid_t parent = 0;
  rest >> state >> parent;
  return state == 'Z' ? 0 : parent;
}

}  // namespace

Points PointsIn(const fs::path& path) {
  Result<Store> store = Store::Open(path, {.create = false});
  EXPECT_TRUE(store.ok()) << store.error().message;
  const auto keys =
      store->KeysLike("", std::numeric_limits<std::int32_t>::max());
  EXPECT_TRUE(keys.ok());
  Points points;
  for (const std::string& key : *keys) {
    const auto job = store->FindJob(key);
    EXPECT_TRUE(job.ok() && *job && (*job)->outcome) << key;
    const Outcome& outcome = *(*job)->outcome;
    points[key] = {outcome.ending, outcome.values_s, outcome.rung};
  }
  return points;
}

const Points& Undisturbed() {
  static const Points& points = *[] {
    const TemporaryFolder folder;
    Night night(folder.path() / "quiet.db");
    EXPECT_LE(night.Wait(), 1) << night.Words();
    return new Points(PointsIn(folder.path() / "quiet.db"));
  }();
  return points;
}

Night::Night(const fs::path& store, const std::vector<std::string>& more)
    : process_(
          GATEDYNO_BIN_DIR "/gatedyno",
          bp::args = ArgumentsFor(store, more),
          bp::std_in<bp::null, bp::std_out>(streams_.path() / "out").string(),
          bp::std_err > (streams_.path() / "err").string()) {}

Night::~Night() {
  if (running()) {
    ::kill(pid(), SIGKILL);
  }
  Wait();
}

std::vector<pid_t> Night::Workers() const {
  std::vector<pid_t> workers;
  for (const fs::directory_entry& entry : fs::directory_iterator("/proc")) {
    const std::string name = entry.path().filename();
    if (std::isdigit(static_cast<unsigned char>(name.front())) != 0 &&
        ParentOf(entry.path()) == pid()) {
      workers.push_back(std::stoi(name));
    }
  }
  return workers;
}

int Night::Wait() {
  constexpr int kSignalled = 128;
  std::error_code ignored;
  process_.wait(ignored);
  const int status = process_.native_exit_code();
  return WIFSIGNALED(status) ? kSignalled + WTERMSIG(status)
                             : WEXITSTATUS(status);
}

std::string Night::Words() {
  return *ReadFile(streams_.path() / "err");
}

}  // namespace gatedyno
