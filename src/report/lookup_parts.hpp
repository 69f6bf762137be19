#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

#include "rainledger/report/lookup_report.hpp"
#include "report/display.hpp"

// Pieces of a look-up that its texts share.
namespace rainledger {

inline constexpr std::size_t kLookupWidth = 98;

inline constexpr std::size_t kFragmentIndent = 4;

/// `lead` and `text`, broken at blanks into lines of at most `width`, each ending in a newline; the
/// second and later lines begin with `hang`. A word longer than a line stands alone.
[[nodiscard]] std::string filled(std::string lead, std::string_view text, std::string_view hang,
                                 std::size_t width = kLookupWidth);

/// A number as a table prints it: seven figures at most.
[[nodiscard]] std::string plain_number(double value);

/// A value in the source's own unit, as a scenario takes it: "0.34 cm/h"; a plain number alone.
[[nodiscard]] std::string as_printed(double canonical, const ValueView& view);

/// What is wrong with the printed value, with what to take instead, in units people read.
[[nodiscard]] std::string fault_words(const ValueView& view, const Display& display);

/// A value of a row in units people read: "3.4 mm/h".
[[nodiscard]] std::string shown_value(double canonical, const ValueView& view,
                                      const Display& display);

/// Author, year and place: "Rawls, Brakensiek and Miller 1983, table 4".
[[nodiscard]] std::string short_citation(const Provenance& provenance);

/// The value of a row with that key; the row must have it.
[[nodiscard]] const ValueView& value_of(const RowView& row, std::string_view key);

/// Lines of comment in a fragment.
[[nodiscard]] std::string yaml_comment(std::string_view words);

/// The rows of one section as text: one in full, several as a table, none as nothing.
[[nodiscard]] std::string row_text(const RowView& row, const Display& display);
[[nodiscard]] std::string table_text(const std::vector<RowView>& rows, const Display& display);

}  // namespace rainledger
