#pragma once

#include "rain/csv_header.hpp"
#include "rain/csv_rows.hpp"
#include "rain/csv_steps.hpp"
#include "rain/csv_text.hpp"

// The fast lane for the bulk of a long file.
namespace rainledger {

/// Reads rows that are nothing but bare numbers and that follow on without anything to report,
/// straight from the text, and stops before the first other row. Such rows mean the same to
/// CsvRowReader and CsvStepMaker::add; this only spares cutting them into lines and cells.
void add_plain_rows(const CsvColumns& columns, const CsvRowReader& reader, CsvLines& lines,
                    CsvStepMaker& maker);

}  // namespace rainledger
