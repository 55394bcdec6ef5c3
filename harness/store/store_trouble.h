// What kind of failure a store met, for a caller that can wait it out.

#ifndef GATEDYNO_STORE_STORE_TROUBLE_H_
#define GATEDYNO_STORE_STORE_TROUBLE_H_

namespace gatedyno {

enum class StoreTrouble {
  kLocked,  // Another process writes: the same call may work later.
  kFull,    // No room, on the disk or in a quota: it may work once there is.
  kOther,   // Trying again is of no use.
};

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_STORE_TROUBLE_H_
