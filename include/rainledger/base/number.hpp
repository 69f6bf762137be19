#pragma once

#include <optional>
#include <string>
#include <string_view>

// Number text: one strict reader for every number that enters (scenario values, CSV cells, options)
// and the writers for every number that leaves. Locale plays no part in either direction.
namespace rainledger {

/// The value of `text` if the whole of it is one finite decimal number ("12", "-0.5", "+3",
/// "1e-3"). Anything else (empty, blanks, trailing characters, hexadecimal, "inf", "nan", out of
/// range) is refused.
[[nodiscard]] std::optional<double> parse_number(std::string_view text);

/// Appends the shortest text that parses back to the same double. `value` must be finite.
void append_shortest(std::string& out, double value);

/// The shortest text that parses back to the same double. `value` must be finite.
[[nodiscard]] std::string shortest(double value);

/// `value` with a fixed number of decimals, for people; a value that rounds to zero has no sign.
[[nodiscard]] std::string fixed(double value, int decimals);

/// `value` to three significant figures without an exponent (1180000, 342, 3.42, 0.0342), for
/// people; decimals stop at six, and what rounds to nothing there is "0".
[[nodiscard]] std::string three_figures(double value);

}  // namespace rainledger
