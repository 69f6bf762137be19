#pragma once

#include <map>
#include <span>
#include <string>
#include <string_view>
#include <vector>

// Words of a command line, sorted into options and the rest.
namespace rainledger {

/// One option of a command; parsing and help both read this table.
struct OptionRow {
    std::string_view name;      ///< "ledger", written --ledger
    std::string_view argument;  ///< "FILE.csv"; empty for a switch
    std::string_view text;      ///< for the help, at most two lines
};

struct Arguments {
    std::map<std::string, std::string, std::less<>> options;  ///< by name; a switch has no text
    std::vector<std::string> words;                           ///< what is no option, in order
    std::string problem;  ///< what is wrong, one line; empty when nothing is

    [[nodiscard]] bool has(std::string_view name) const { return options.contains(name); }
    /// The option's text, or nothing to say that it was not given.
    [[nodiscard]] const std::string* find(std::string_view name) const;
};

/// Sorts the words. An unknown option (with the nearest known one), a repeated one, one without its
/// argument, an empty argument: each is the problem. Nothing is abbreviated.
[[nodiscard]] Arguments sort_arguments(std::span<const std::string> given,
                                       std::span<const OptionRow> known);

/// True if -h or --help stands among the words before a "--".
enum class HelpWanted { none, short_page, long_page };
[[nodiscard]] HelpWanted help_wanted(std::span<const std::string> given);

/// "did you mean '--json'?" for an option that nobody knows.
[[nodiscard]] std::string option_suggestion(std::string_view typed,
                                            std::span<const OptionRow> known);

}  // namespace rainledger
