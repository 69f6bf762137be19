#pragma once

#include <optional>
#include <string>
#include <string_view>

// What to write in place of a time that is not read: dates in other orders, times without dates.
namespace rainledger {

/// How a text that is no timestamp and no number may have been meant.
enum class TimeShape {
    other,
    time_of_day,  ///< "0:05", "10:00:00", "10:05 PM"
    date,         ///< "04/03/2031 10:00", "04.03.2031", "2031/3/4 1:05"
    total         ///< "Total": the last row of a spreadsheet
};
[[nodiscard]] TimeShape time_shape(std::string_view text);

/// The advice for a text that stands where a timestamp is wanted in the column called `column`,
/// with the text rewritten in every order in which it is a date. Nothing for other shapes.
[[nodiscard]] std::optional<std::string> stamp_advice(std::string_view text,
                                                      std::string_view column);

/// The advice for a text that stands where an elapsed time in `unit` is wanted.
[[nodiscard]] std::optional<std::string> elapsed_advice(std::string_view text,
                                                        std::string_view unit);

}  // namespace rainledger
