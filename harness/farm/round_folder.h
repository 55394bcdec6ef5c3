// Where everything of a farm lies, in a folder that all nodes share:
//
//   FOLDER/farm-run                       locked by the run that uses FOLDER
//   FOLDER/round-3f9a1c22/                one submission; gone when merged
//     share-0.jobs                        jobs, one JSON text a line
//     share-0.node7-4711-1.result         a store: what a task did of them
//   FOLDER/logs/round-3f9a1c22-share-0-17.log    of tasks that ended early
//
// Array task 0 of the round works share 0.  A task publishes as often as it
// likes, each time a new result file with what was new; a file that bears its
// name is whole and never changes.  Any number of tasks may work one share,
// one after the other or at once: each skips what it finds published.

#ifndef GATEDYNO_FARM_ROUND_FOLDER_H_
#define GATEDYNO_FARM_ROUND_FOLDER_H_

#include <filesystem>
#include <string>
#include <vector>

#include "harness/base/result.h"

namespace gatedyno {

struct ResultName {
  int share = 0;
  std::filesystem::path path;
};

class RoundFolder {
 public:
  // A new one, of a name no other round ever had.
  static Result<RoundFolder> Make(const std::filesystem::path& farm);
  // Those there are, in no order.
  static Result<std::vector<RoundFolder>> All(
      const std::filesystem::path& farm);

  RoundFolder(std::filesystem::path farm, std::string name);

  const std::string& name() const { return name_; }  // "round-3f9a1c22"
  const std::filesystem::path& farm() const { return farm_; }
  std::filesystem::path path() const { return farm_ / name_; }
  // What the queue knows the round's tasks by.
  std::string QueueName() const { return "gatedyno-" + name_; }

  std::filesystem::path ShareFile(int share) const;
  // Of this process; `number` counts its publications.
  std::filesystem::path NewResult(int share, int number) const;
  // What is published so far, in the order of the names.
  Result<std::vector<ResultName>> Results() const;

  // Slurm's file name pattern (%a the share, %A the array).
  std::string LogPattern() const;
  std::filesystem::path LogFile(int share, const std::string& array) const;

  void RemoveLogs(int share) const;
  // The round itself; logs stay.
  Status Remove() const;

 private:
  std::filesystem::path farm_;
  std::string name_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_ROUND_FOLDER_H_
