#include <cmath>
#include <cstddef>

#include <fmt/core.h>

#include "rainledger/base/number.hpp"
#include "report/fit_parts.hpp"

namespace rainledger {
namespace {

constexpr double kMinutesPerHour = 60.0;

/// A pit's name as a cell, after RFC 4180.
std::string name_cell(const std::string& name) {
    if (name.find_first_of("\",\r\n") == std::string::npos) return name;
    std::string cell = "\"";
    for (const char c : name)
        cell += c == '"' ? std::string("\"\"") : std::string(1, c);
    return cell + "\"";
}

/// Minutes without the rounding that hours carry.
std::string minutes(double hours) {
    return fmt::format("{:.12g}", hours * kMinutesPerHour);
}

std::string header(const FieldFit& fit) {
    std::string out = "pit,reading,end_min,depth_mm,rate_mm_per_h";
    const auto add = [&](std::string_view lead) {
        for (const FieldLaw law : fit.options.laws)
            out += fmt::format(",{0}{1}_depth_mm,{0}{1}_rate_mm_per_h", lead, field_law_key(law));
    };
    add("");
    if (fit.pooled) add("pooled_");
    return out + "\n";
}

/// The fitted cells of one reading; empty ones where a law was not fitted.
std::string fitted_cells(const std::vector<LawFitAnswer>& laws, std::size_t reading) {
    std::string out;
    for (const LawFitAnswer& answer : laws) {
        if (!answer.fit) {
            out += ",,";
            continue;
        }
        const FittedReading& fitted = answer.fit->readings[reading];
        out += "," + shortest(fitted.fitted_depth_mm) + "," + shortest(fitted.fitted_rate_mm_per_h);
    }
    return out;
}

}  // namespace

std::string fit_csv(const ShownFit& shown) {
    const FieldFit& fit = shown.fit;
    std::string out = header(fit);
    std::size_t among_all = 0;
    for (const TestFit& pit : fit.pits) {
        const std::string name = name_cell(pit.test.pit);
        for (std::size_t i = 0; i < pit.test.readings.size(); ++i, ++among_all) {
            const TestReading& reading = pit.test.readings[i];
            out += fmt::format("{},{},{},{},{}", name, pit.ignored_readings + i + 1,
                               minutes(reading.end_h), shortest(reading.depth_mm),
                               shortest(reading.rate_mm_per_h));
            out += fitted_cells(pit.laws, i);
            if (fit.pooled) out += fitted_cells(fit.pooled->laws, among_all);
            out += '\n';
        }
    }
    return out;
}

}  // namespace rainledger
