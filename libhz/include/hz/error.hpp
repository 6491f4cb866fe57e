// Trouble with the world outside a row: files, options, disks.
#pragma once
#include <stdexcept>
#include <string>

namespace hz {

/// Who can mend it; the program's exit code follows from it.
enum class Fault { usage = 2, input = 3, output = 4 };

/// Thrown when a whole run cannot go on. what() is one sentence that names the file and place and says what to do.
class Error : public std::runtime_error {
public:
  Error(Fault fault, const std::string& what) : std::runtime_error(what), fault_(fault) {}
  [[nodiscard]] Fault fault() const { return fault_; }

private:
  Fault fault_;
};

}  // namespace hz
