#pragma once

#include <cstddef>
#include <string>
#include <string_view>

// Words that come from outside, on their way into a picture.
namespace rainledger {

/// `text` as it is shown: printable, and without the two characters that no SVG may hold.
[[nodiscard]] std::string shown_words(std::string_view text);

/// `text` as a gnuplot string in single quotes, in which nothing is run, replaced or read as
/// markup. A single quote inside is set as an apostrophe (U+2019): gnuplot 5.4 takes a doubled one
/// at the start of a string for the end of it, and what follows for a command.
[[nodiscard]] std::string quoted(std::string_view text);

/// `text` cut to `most` columns of a monospaced page (wide characters take two), "..." at the end.
[[nodiscard]] std::string shortened(std::string_view text, std::size_t most);

/// The columns that `text` takes there.
[[nodiscard]] std::size_t columns_used(std::string_view text);

}  // namespace rainledger
