#pragma once

#include <string_view>

#include "rain/csv_header.hpp"
#include "rain/csv_steps.hpp"
#include "rain/csv_text.hpp"
#include "rainledger/rain/hyetograph.hpp"

// What only a whole hyetograph shows: sizes beyond the limits, and lengths that speak of a slip.
namespace rainledger {

/// Reports steps shorter than 1 ms and times, depths and intensities above 1e12 in h, mm and mm/h
/// as errors; without any, warns of steps over three times the median and of steps that a change
/// of the UTC offset made longer or shorter. `text` is the file that `rain` was read from.
void check_steps(const Hyetograph& rain, const CsvSteps& steps, const CsvColumns& columns,
                 std::string_view text, CsvProblems& problems);

}  // namespace rainledger
