// The options of a command as tables, and a command line read by them. Help and man page are made from the same tables.
#pragma once
#include <map>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace hz::app {

/// Under which heading help shows an option.
enum class OptionGroup { input, answer, output };

enum class OptionKind {
  flag,   // no value
  value,  // one value; giving it twice is an error
  list,   // one value each time, any number of times
};

struct Option {
  std::string_view name;  // long name, without dashes
  char letter = '\0';     // short name; '\0' for none
  OptionKind kind = OptionKind::value;
  std::string_view placeholder;  // stands for the value in help; empty for a flag
  OptionGroup group = OptionGroup::answer;
  std::string_view help;  // a phrase without a full stop
};

/// A word of the command line that is not an option.
struct Positional {
  std::string_view name;  // as help shows it
  bool required = true;
  std::string_view help;
};

/// A command line, read. Asking for an option that is not in the command's tables is a bug (std::logic_error).
class Arguments {
public:
  /// Reads the words after the command's name. Throws hz::Error (usage) with the closest option where one is unknown.
  [[nodiscard]] static Arguments read(std::string_view command, std::span<const Option> options,
                                      std::span<const Positional> positionals, std::span<const std::string> words);

  [[nodiscard]] bool has(std::string_view option) const;
  /// The value of an option given once.
  [[nodiscard]] std::optional<std::string> value(std::string_view option) const;
  /// Every value of an option, in the order given.
  [[nodiscard]] std::vector<std::string> values(std::string_view option) const;
  /// The words that are not options, in the order given; never more than the command has positionals.
  [[nodiscard]] const std::vector<std::string>& words() const { return words_; }
  /// Whether the command has this option at all.
  [[nodiscard]] bool knows(std::string_view option) const;

private:
  std::map<std::string, std::vector<std::string>, std::less<>> given_;  // every option of the command; empty: not given
  std::vector<std::string> words_;
};

/// The value of `option` as a finite number. Throws hz::Error (usage) naming the option.
[[nodiscard]] double option_number(std::string_view option, std::string_view text);

/// The value of `option` as a whole number of at least `least`. Throws hz::Error (usage).
[[nodiscard]] unsigned long long option_count(std::string_view option, std::string_view text, unsigned long long least);

/// A word that an option accepts, and what it stands for.
template <class T>
struct OptionWord {
  std::string_view word;
  T meaning;
};

/// The index of `text` among `allowed`. Throws hz::Error (usage) that lists what is allowed.
[[nodiscard]] std::size_t option_word_index(std::string_view option, std::string_view text,
                                            std::span<const std::string_view> allowed);

/// What `text` stands for. Throws hz::Error (usage) that lists what is allowed.
template <class T>
[[nodiscard]] T option_word(std::string_view option, std::string_view text, std::span<const OptionWord<T>> allowed) {
  std::vector<std::string_view> words;
  for (const OptionWord<T>& each : allowed) words.push_back(each.word);
  return allowed[option_word_index(option, text, words)].meaning;
}

}  // namespace hz::app
