#pragma once

#include <algorithm>
#include <string>
#include <utility>
#include <vector>

#include "fieldtest/tests_of.hpp"
#include "rainledger/losses/horton.hpp"
#include "rainledger/report/fit_report.hpp"

// Field tests of invented readings, fitted.
namespace rainledger::sample {

inline const std::vector<double> kPitMinutes{5, 10, 15, 20, 30, 40, 50, 60, 75, 90, 105, 120};

/// Steady in the end at about 30 mm/h.
inline InfiltrationTest good_pit(const std::string& name = {}) {
    return test_of(ReadingKind::infiltrated, kPitMinutes,
                   {9.1, 15.6, 21.2, 25.9, 33.8, 40.6, 46.5, 52.1, 60.1, 67.9, 75.4, 83.0}, name);
}

/// Slower than good_pit, and steady in the end at about 21 mm/h.
inline InfiltrationTest slow_pit(const std::string& name) {
    return test_of(ReadingKind::infiltrated, kPitMinutes,
                   {6.0, 10.4, 14.5, 17.6, 23.4, 28.2, 32.7, 36.5, 42.1, 47.5, 52.6, 57.9}, name);
}

/// Faster than good_pit.
inline InfiltrationTest fast_pit(const std::string& name) {
    return test_of(ReadingKind::infiltrated, kPitMinutes,
                   {12.2, 20.9, 28.0, 34.4, 44.6, 53.1, 60.7, 67.9, 78.0, 87.9, 97.6, 107.2}, name);
}

/// Stopped after a quarter of an hour, its rate still falling; read by drops.
inline InfiltrationTest short_pit() {
    return test_of(ReadingKind::drop, {2, 4, 6, 9, 12, 15}, {5.0, 4.1, 3.6, 4.4, 3.9, 3.1});
}

/// Readings that follow Horton's curve exactly.
inline InfiltrationTest horton_pit(const HortonCurve& curve, const std::string& name = {}) {
    std::vector<double> depths;
    for (const double minute : kPitMinutes)
        depths.push_back(horton_cumulative(curve, minute / 60.0));
    return test_of(ReadingKind::infiltrated, kPitMinutes, depths, name);
}

/// Nothing infiltrates.
inline InfiltrationTest dry_pit() {
    return test_of(ReadingKind::infiltrated, {10, 20, 30, 40}, {0.0, 0.0, 0.0, 0.0});
}

/// F = 20 sqrt(t): Green-Ampt's conductivity ends on 0 and its suction-deficit product is
/// unlimited.
inline InfiltrationTest root_pit() {
    return test_of(ReadingKind::infiltrated, {15, 60, 135, 240}, {10.0, 20.0, 30.0, 40.0});
}

/// Rates divided by 2 for design.
inline FieldFitOptions halved() {
    FieldFitOptions options;
    options.design_factor = 2.0;
    return options;
}

inline ShownFit shown_of(std::vector<InfiltrationTest> tests, FieldFitOptions options = {}) {
    FieldFitAnswer answer = fit_field_tests(tests, options);
    INFO((answer.problems.empty() ? std::string() : answer.problems.front()));
    REQUIRE(answer.fit);
    return {"Quarry Row, pit 3", "pit3.csv", false, *std::move(answer.fit)};
}

/// The fit of one law to one pit.
inline const LawFit& law_of(const ShownFit& shown, FieldLaw law) {
    const auto& laws = shown.fit.pits.front().laws;
    const auto answer = std::ranges::find(laws, law, &LawFitAnswer::law);
    REQUIRE(answer != laws.end());
    REQUIRE(answer->fit);
    return *answer->fit;
}

inline ShownFit three_pits(FieldFitOptions options = {}) {
    ShownFit shown =
        shown_of({good_pit("north"), slow_pit("middle"), fast_pit("south")}, std::move(options));
    shown.title = "Millbrook depot, swale";
    shown.readings = "swale.csv";
    return shown;
}

}  // namespace rainledger::sample
