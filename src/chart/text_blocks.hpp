#pragma once

#include <cstddef>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "chart/drawn_steps.hpp"
#include "chart/scale.hpp"
#include "chart/time_axis.hpp"

// Charts in block characters: one text column is one slice of the time.
namespace rainledger {

inline constexpr std::size_t kGutter = 8;  // columns left of a panel, for its scale
inline constexpr std::size_t kTextWidth = 90;
inline constexpr std::size_t kNameColumns = 50;  // of a storm or surface before its figures

/// Which step each of `columns` equal slices of `span_h` shows: the heaviest of those that hold its
/// middle or have their own in it. No step where the rain has ended.
inline constexpr std::size_t kNoStep = static_cast<std::size_t>(-1);
[[nodiscard]] std::vector<std::size_t> steps_of_columns(const Hyetograph& rain, std::size_t steps,
                                                        std::span<const double> weight,
                                                        double span_h, std::size_t columns);

/// Columns of `values` standing on the last of `rows` rows, to an eighth of a row; `top` is where
/// the first row ends. A value above zero shows at least an eighth.
[[nodiscard]] std::vector<std::string> standing_blocks(std::span<const double> values, double top,
                                                       std::size_t rows);

/// The same hanging from the first row, to half a row.
[[nodiscard]] std::vector<std::string> hanging_blocks(std::span<const double> values, double top,
                                                      std::size_t rows);

/// A row with its place on the scale before it.
[[nodiscard]] std::string scaled_row(std::string_view scale, std::string_view row);

/// Rows between two ticks, so that a panel has about a dozen.
[[nodiscard]] std::size_t rows_between_ticks(const std::vector<Tick>& ticks);

/// Rows of blocks with a word before the last of them; empty rows above are left out.
[[nodiscard]] std::string labelled_rows(std::string_view word,
                                        const std::vector<std::string>& rows);

/// The time axis below a panel: a line with ticks, and their labels.
[[nodiscard]] std::string time_rows(const TimeAxis& time, std::size_t columns);

/// Two lines: the title, and what stands below it; made printable, shortened, and a blank line.
[[nodiscard]] std::string text_title(std::string_view title, std::string_view below);

/// `text` filled with blanks to `columns` columns, or shortened to them.
[[nodiscard]] std::string padded(std::string_view text, std::size_t columns);

/// `glyph` repeated.
[[nodiscard]] std::string repeated(std::string_view glyph, std::size_t times);

}  // namespace rainledger
