#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "rainledger/base/quantity.hpp"
#include "rainledger/reference/provenance.hpp"

// Published numbers, and rows of them in a form that any table can be shown in.
namespace rainledger {

/// A published range, low <= high.
struct ValueRange {
    double low = 0.0;
    double high = 0.0;
};

/// A published number and its range, in canonical units. Tables hold numbers in the unit that the
/// source prints and convert them once, where the row is written; nothing else is done to them. A
/// source that gives a range alone has no value here: none is made up from it.
struct PublishedValue {
    std::optional<double> value = {};
    std::optional<ValueRange> range = {};
};

/// A printed number that does not fit, kept as printed, and why.
struct PrintedFault {
    std::string_view words;
    std::optional<double> corrected = {};  ///< what to take instead, canonical unit
    std::optional<ValueRange> corrected_range = {};
};

/// One number of a row, for showing.
struct ValueView {
    std::string_view key;                    ///< with its unit, as in JSON: "suction_mm"
    std::string_view label;                  ///< "wetting-front suction"
    std::optional<Dimension> dimension;      ///< of the canonical value; empty: a plain number
    std::string_view printed_unit;           ///< the source's; empty: a plain number
    PublishedValue published;                ///< canonical unit; a cell may be empty
    std::optional<PrintedFault> fault = {};  ///< when the printed number does not fit
};

/// One row of any table, for showing.
struct RowView {
    std::string name;
    std::vector<ValueView> values;
    std::vector<std::string_view> notes;
    Provenance provenance;
};

}  // namespace rainledger
