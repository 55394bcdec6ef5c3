// One open file descriptor and its owner.

#ifndef GATEDYNO_SIM_DESCRIPTOR_H_
#define GATEDYNO_SIM_DESCRIPTOR_H_

#include <utility>

#include <unistd.h>

namespace gatedyno {

class Descriptor {
 public:
  Descriptor() = default;
  explicit Descriptor(int fd) : fd_(fd) {}
  ~Descriptor() { Close(); }
  Descriptor(Descriptor&& other) noexcept
      : fd_(std::exchange(other.fd_, kNone)) {}
  Descriptor& operator=(Descriptor&& other) noexcept {
    if (this != &other) {
      Close();
      fd_ = std::exchange(other.fd_, kNone);
    }
    return *this;
  }
  Descriptor(const Descriptor&) = delete;
  Descriptor& operator=(const Descriptor&) = delete;

  bool is_open() const { return fd_ != kNone; }
  // REQUIRES: is_open().
  int get() const { return fd_; }
  void Close() {
    if (is_open()) {
      ::close(std::exchange(fd_, kNone));
    }
  }

 private:
  static constexpr int kNone = -1;  // What open() returns for "none".

  int fd_ = kNone;
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_DESCRIPTOR_H_
