#pragma once

#include <string>

#include "rain/csv_header.hpp"
#include "rain/record_oddities.hpp"
#include "rainledger/rain/hyetograph_csv.hpp"

// The last line of a record that was being written.
namespace rainledger {

/// Takes the last line off where it has no line end and makes no row: its cells are too few or
/// cannot be read, its rain is missing in interval data, or it ends in a time that is written
/// shorter than the one above or is earlier, since it may have lost its end.
void drop_partial_line(std::string& text, const CsvColumns& columns, const CsvLayout& layout,
                       RecordOddities& oddities);

}  // namespace rainledger
