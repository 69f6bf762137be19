#include "rainledger/reference/interception_values.hpp"
#include "rainledger/reference/steady_rates.hpp"
#include "report/lookup_find.hpp"
#include "report/lookup_parts.hpp"

// Interception by plants, and the rates that a field test is judged by.
namespace rainledger {
namespace {

LookupAnswer in_a_storm(const InterceptionRow& row, const LookupAsked& asked) {
    const auto held = interception_mm(row, *asked.rain_mm, asked.crop_height_mm);
    if (!held.value)
        return refused(held.problem, row.per_foot_of_height ? "write it as --height '1.2 m'" : "");
    const Display display(asked.units);
    RowView view = view_of(row);
    std::string storm = "a storm of " + display.parameter(*asked.rain_mm, Dimension::depth);
    if (asked.crop_height_mm)
        storm += " on a crop of " + display.parameter(*asked.crop_height_mm, Dimension::depth);
    view.values.push_back(
        {"interception_mm", "held of this storm", Dimension::depth, "in", {*held.value, {}}});
    LookupSection section{"Interception", {view}, {}, {}, {}};
    section.lines.push_back("Held of " + storm + ": " +
                            display.parameter(*held.value, Dimension::depth) + ".");
    section.yaml = yaml_comment(view.name + ", " + storm + ": " + short_citation(view.provenance)) +
                   "interception: " + four_figures(*held.value) + " mm\n";
    return answered(std::move(section));
}

}  // namespace

LookupAnswer look_up_interception(const LookupAsked& asked) {
    if (asked.crop_height_mm && !asked.rain_mm)
        return refused("--height goes with the depth of a storm; add --rain '30 mm'");
    const auto rows = rows_asked(interception_rows(), "interception", asked.name);
    if (!rows.value) return refused(rows.problem, rows.hint);
    if (asked.rain_mm && rows.value->size() > 1)
        return refused("--rain needs one kind of plants, and " +
                           std::to_string(rows.value->size()) + " are shown",
                       "name one, such as 'rainledger lookup interception orchards'");
    if (asked.rain_mm) return in_a_storm(*rows.value->front(), asked);
    LookupSection section{"Interception by plants in one storm", views_of(*rows.value), {}, {}, {}};
    section.lines.emplace_back(
        "--rain '30 mm', for crops with --height '1.2 m', makes a depth of one row.");
    add_line(section, others_line(interception_rows(), *rows.value, asked.name));
    return answered(std::move(section));
}

LookupAnswer look_up_steady_rate(const LookupAsked& asked) {
    const auto rows = rows_asked(steady_rate_rows(), "steady-rate", asked.name);
    if (!rows.value) return refused(rows.problem, rows.hint);
    LookupSection section{"Typical steady infiltration rates", views_of(*rows.value), {}, {}, {}};
    section.lines.emplace_back(
        "They judge a field test; they are no design values. What a source leaves open stands "
        "empty.");
    add_line(section, others_line(steady_rate_rows(), *rows.value, asked.name));
    return answered(std::move(section));
}

}  // namespace rainledger
