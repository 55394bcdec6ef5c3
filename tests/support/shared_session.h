// The one simulator a test program can have.

#ifndef GATEDYNO_TESTS_SUPPORT_SHARED_SESSION_H_
#define GATEDYNO_TESTS_SUPPORT_SHARED_SESSION_H_

#include <memory>

#include <gtest/gtest.h>

#include "harness/worker/session.h"

namespace gatedyno {

// Never destroyed: the library has no way to be unloaded in order.
inline Session& SharedSession() {
  // The simulator is global state, whatever this says.
  // NOLINTNEXTLINE(cppcoreguidelines-avoid-non-const-global-variables)
  static Session& session = *[] {
    Result<std::unique_ptr<Session>> started = Session::Start();
    EXPECT_TRUE(started.ok()) << started.error().message;
    return started->release();
  }();
  return session;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_SUPPORT_SHARED_SESSION_H_
