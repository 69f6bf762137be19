#pragma once

#include <string>
#include <utility>
#include <variant>

#include "rainledger/rain/gauge_record.hpp"
#include "test.hpp"

namespace rainledger {

/// A log of 0.2 mm tips.
inline RecordLayout tip_layout() {
    RecordLayout layout;
    layout.tip_mm = 0.2;
    return layout;
}

/// A record and everything that reading it reports, as people see it.
struct ReadRecordText {
    std::optional<GaugeRecord> record;
    std::string report;
};

/// Checks that there is a record exactly when nothing is an error.
inline ReadRecordText read_record_text(std::string text, const RecordLayout& layout) {
    Diagnostics diagnostics;
    ReadRecordText read;
    read.record = read_gauge_record("logger.csv", std::move(text), layout, diagnostics);
    CHECK(read.record.has_value() != diagnostics.has_errors());
    for (const Diagnostic& diagnostic : diagnostics.list())
        read.report += render(diagnostic);
    return read;
}

/// The record of a text in which nothing is to be reported.
inline GaugeRecord clean_record(std::string text, const RecordLayout& layout) {
    ReadRecordText read = read_record_text(std::move(text), layout);
    CHECK(read.report == "");
    REQUIRE(read.record.has_value());
    return *std::move(read.record);
}

inline const TipLog& tips_of(const GaugeRecord& record) {
    REQUIRE(record.is_tips());
    return std::get<TipLog>(record.rain);
}

inline const Hyetograph& steps_of_record(const GaugeRecord& record) {
    REQUIRE_FALSE(record.is_tips());
    return std::get<Hyetograph>(record.rain);
}

}  // namespace rainledger
