// On a terminal, which only a pseudo-terminal can stand in for.

#include <cstdlib>
#include <string>
#include <vector>

#include <gtest/gtest.h>
#include <pty.h>
#include <sys/wait.h>
#include <unistd.h>

namespace gatedyno {
namespace {

struct Shown {
  int status = 0;
  std::string text;
};

// All three streams of the program are the terminal.
Shown RunOnTerminal(const std::vector<const char*>& environment,
                    std::vector<const char*> arguments) {
  const char* program = GATEDYNO_BIN_DIR "/gatedyno";
  arguments.insert(arguments.begin(), program);
  arguments.push_back(nullptr);
  int terminal = -1;
  const pid_t child = ::forkpty(&terminal, nullptr, nullptr, nullptr);
  if (child == 0) {
    for (const char* variable : {"NO_COLOR", "TERM"}) {
      ::unsetenv(variable);  // NOLINT(concurrency-mt-unsafe)
    }
    for (const char* setting : environment) {
      ::putenv(const_cast<char*>(setting));  // NOLINT
    }
    ::execv(program, const_cast<char**>(arguments.data()));  // NOLINT
    ::_exit(127);
  }
  Shown shown;
  char buffer[4096];
  // The end of the child shows as an error.
  for (ssize_t got = ::read(terminal, buffer, sizeof buffer); got > 0;
       got = ::read(terminal, buffer, sizeof buffer)) {
    shown.text.append(buffer, static_cast<size_t>(got));
  }
  ::close(terminal);
  ::waitpid(child, &shown.status, 0);
  return shown;
}

bool HasColour(const std::string& text) {
  return text.find('\x1b') != std::string::npos;
}

TEST(TerminalTest, ColourUnlessUnwanted) {
  EXPECT_TRUE(
      HasColour(RunOnTerminal({"TERM=xterm"}, {"estimate", "inv"}).text));
  EXPECT_FALSE(HasColour(
      RunOnTerminal({"TERM=xterm", "NO_COLOR=1"}, {"estimate", "inv"}).text));
  EXPECT_FALSE(
      HasColour(RunOnTerminal({"TERM=dumb"}, {"estimate", "inv"}).text));
  // An empty value is none: no-color.org.
  EXPECT_TRUE(HasColour(
      RunOnTerminal({"TERM=xterm", "NO_COLOR="}, {"estimate", "inv"}).text));
}

// As `gatedyno estimate '*' | head -1` ends it: by the signal, silently.
TEST(TerminalTest, AClosedPipeEndsItQuietly) {
  int ends[2];
  ASSERT_EQ(::pipe(ends), 0);
  const pid_t child = ::fork();
  if (child == 0) {
    ::close(ends[0]);
    ::dup2(ends[1], STDOUT_FILENO);
    ::close(ends[1]);
    ::execl(GATEDYNO_BIN_DIR "/gatedyno",
            "gatedyno",
            "estimate",
            "*",
            static_cast<char*>(nullptr));
    ::_exit(127);
  }
  ::close(ends[0]);
  ::close(ends[1]);
  int status = 0;
  ASSERT_EQ(::waitpid(child, &status, 0), child);
  EXPECT_TRUE(WIFSIGNALED(status));
  EXPECT_EQ(WTERMSIG(status), SIGPIPE);
}

}  // namespace
}  // namespace gatedyno
