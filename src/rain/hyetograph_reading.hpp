#pragma once

#include <optional>
#include <string>

#include "rainledger/base/diagnostic.hpp"
#include "rainledger/rain/hyetograph_csv.hpp"

// Reading a hyetograph out of a text that has been opened.
namespace rainledger {

/// Whose rows they are: the advice on rows out of order differs.
enum class RowsOf { storm, record };

/// As read_hyetograph_csv, of text without a byte-order mark.
[[nodiscard]] std::optional<Hyetograph> read_hyetograph_rows(const std::string& name,
                                                             std::string text,
                                                             const CsvLayout& layout,
                                                             RowsOf rows_of,
                                                             Diagnostics& diagnostics);

}  // namespace rainledger
