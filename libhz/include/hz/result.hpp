// A value, or the reason why there is none.
#pragma once
#include <string>
#include <utility>
#include <variant>

#include "hz/require.hpp"

namespace hz {

/// What kind of trouble a row met. "Outside validity" and "unreadable" are different things to an observer.
enum class ProblemCode {
  unreadable,    // the text is not a value of this kind
  missing,       // nothing that would give the quantity
  out_of_range,  // outside its domain or outside a published range
  only_a_limit,  // an upper or lower limit where a value is needed
};

/// Why a row, or one quantity of it, has no answer. `what` is one sentence without a full stop.
struct Problem {
  ProblemCode code = ProblemCode::missing;
  std::string column;
  std::string what;
};

/// A T or a Problem; the member names are those of C++23's std::expected.
///
/// Reading value() of a failed result, or error() of a good one, is a broken precondition (std::logic_error).
template <class T>
class [[nodiscard]] Result {
public:
  Result(T value) : state_(std::in_place_index<0>, std::move(value)) {}
  Result(Problem problem) : state_(std::in_place_index<1>, std::move(problem)) {}

  [[nodiscard]] bool has_value() const { return state_.index() == 0; }
  explicit operator bool() const { return has_value(); }

  [[nodiscard]] const T& value() const {
    HZ_REQUIRE(has_value());
    return *std::get_if<0>(&state_);
  }
  [[nodiscard]] const T& operator*() const { return value(); }
  [[nodiscard]] const T* operator->() const { return &value(); }

  [[nodiscard]] const Problem& error() const {
    HZ_REQUIRE(!has_value());
    return *std::get_if<1>(&state_);
  }

private:
  std::variant<T, Problem> state_;
};

}  // namespace hz
