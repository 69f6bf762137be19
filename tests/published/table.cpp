#include "published/table.hpp"

#include <algorithm>
#include <array>
#include <cstddef>
#include <string_view>

#include "published/check_files.hpp"
#include "published/judge.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger::published {
namespace {

std::string_view word_for(Reproduces mark) {
    switch (mark) {
        case Reproduces::yes:
            return "yes";
        case Reproduces::rounding:
            return "by the source's rounding";
        case Reproduces::no:
            return "no";
    }
    return "";
}

std::string with_unit(std::string numbers, const std::string& unit) {
    return unit.empty() ? numbers : numbers + " " + unit;
}

std::string printed_text(const ValueRow& row) {
    std::string text;
    for (const Printed& number : row.numbers)
        text += (text.empty() ? "" : " ") + number.text;
    return with_unit(text, row.unit);
}

/// Our values with one digit more than is printed.
std::string own_text(const std::vector<double>& ours, const ValueRow& row) {
    std::string text;
    for (std::size_t i = 0; i < ours.size(); ++i)
        text +=
            (text.empty() ? "" : " ") + fixed(ours[i], std::max(row.numbers[i].decimals, 0) + 1);
    return with_unit(text, row.unit);
}

std::string row_of(const CheckFile& file, const Check& check) {
    const Verdict verdict = judge(file, check, library_books);
    const std::string_view word = verdict.problems.empty() ? word_for(check.reproduces) : "FAILS";
    return "| " + check.id + " | " + check.source + ", " + check.place + " | " + check.status +
           " | " + printed_text(check.expected) + " | " + own_text(verdict.ours, check.expected) +
           " | " + std::string(word) + " |\n";
}

std::string remarks_of(const CheckFile& file) {
    std::string reasons;
    std::string notes;
    for (const Check& check : file.checks) {
        if (!check.why.empty())
            reasons += "- " + check.id + " (" + std::string(word_for(check.reproduces)) +
                       "): " + check.why + ".\n";
        if (!check.note.empty()) notes += "- " + check.id + ": " + check.note + ".\n";
    }
    if (!reasons.empty()) reasons = "\nNot reproduced as printed:\n\n" + reasons;
    if (!notes.empty()) notes = "\nNotes:\n\n" + notes;
    return reasons + notes;
}

struct Tally {
    std::size_t checks = 0;
    std::size_t values = 0;
    std::array<std::size_t, 3> marked{};  // values by mark, in the order of Reproduces
};

Tally tally_of(std::string_view status) {
    Tally tally;
    for (const ListedFile& listed : kListedFiles)
        for (const Check& check : load(listed.name).checks) {
            if (check.status != status) continue;
            ++tally.checks;
            tally.values += check.expected.numbers.size();
            tally.marked.at(static_cast<std::size_t>(check.reproduces)) +=
                check.expected.numbers.size();
        }
    return tally;
}

std::string tally_row(std::string_view name, const Tally& tally) {
    std::string row = "| " + std::string(name) + " | " + std::to_string(tally.checks) + " | " +
                      std::to_string(tally.values);
    for (const std::size_t count : tally.marked)
        row += " | " + std::to_string(count);
    return row + " |\n";
}

}  // namespace

std::string table_of(const CheckFile& file) {
    std::string text = "### " + file.name.substr(0, file.name.find('.')) +
                       "\n\n| check | source, place | status | printed | ours | reproduces |\n"
                       "|---|---|---|---|---|---|\n";
    for (const Check& check : file.checks)
        text += row_of(file, check);
    return text + remarks_of(file);
}

std::string summary_of_all() {
    std::string text =
        "| status | checks | values | reproduce | by the source's rounding | do not |\n"
        "|---|---|---|---|---|---|\n";
    Tally all;
    for (const std::string_view status : {"confirmed", "from memory", "derived"}) {
        const Tally tally = tally_of(status);
        text += tally_row(status, tally);
        all.checks += tally.checks;
        all.values += tally.values;
        for (std::size_t i = 0; i < all.marked.size(); ++i)
            all.marked.at(i) += tally.marked.at(i);
    }
    return text + tally_row("all", all);
}

}  // namespace rainledger::published
