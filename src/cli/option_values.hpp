#pragma once

#include <optional>
#include <span>
#include <string>
#include <string_view>

#include "cli/arguments.hpp"
#include "rainledger/base/quantity.hpp"
#include "rainledger/report/summary.hpp"

// Values of options that more than one command takes. Each function gives what is wrong in one
// line, or nothing.
namespace rainledger {

/// How a command names its one input, and how a quantity that fell apart is put together again.
struct InputWord {
    std::string_view command;    ///< "losses"
    std::string_view noun;       ///< "scenario"
    std::string_view one_word;   ///< "write a duration as one word: --every '15 min'"
    bool takes_quantity = true;  ///< an option with a quantity was given
};

/// Whether the words that are no options are one input.
[[nodiscard]] std::string input_problem(const Arguments& arguments, const InputWord& input);

/// `--units mm` or `in`; the metric ones where it was not given.
[[nodiscard]] std::string read_units(const Arguments& arguments, DisplayUnits& units);

/// Whether a zero is taken.
enum class Zero { refused, allowed };

/// A quantity of an option, if given, in its canonical unit. `noun` is what a value of zero or less
/// is none of: "step".
[[nodiscard]] std::string read_amount(const Arguments& arguments, std::string_view option,
                                      Dimension dimension, std::string_view noun,
                                      std::optional<double>& amount, Zero zero = Zero::refused);

/// What is wrong with a word that is none of `names`.
[[nodiscard]] std::string unknown_word(std::string_view option, const std::string& text,
                                       std::span<const std::string_view> names);

/// Copies the text of an option, if given.
void read_text(const Arguments& arguments, std::string_view option,
               std::optional<std::string>& text);

/// Whether the ending of --chart's file names a format that can be drawn.
[[nodiscard]] std::string chart_problem(const std::optional<std::string>& path);

}  // namespace rainledger
