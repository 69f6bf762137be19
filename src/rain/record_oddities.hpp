#pragma once

#include <array>
#include <cstddef>
#include <string>
#include <utility>

#include "rain/csv_text.hpp"
#include "rainledger/base/diagnostic.hpp"
#include "rainledger/rain/gauge_record.hpp"

// What a record holds that is odd and yet can be read: counted, and each kind told of once.
namespace rainledger {

enum class Oddity {
    same_instant,
    repeated_rows,
    clock_set_back,
    counter_restart,
    repeated_header,
    partial_last_line,
};

class RecordOddities {
public:
    explicit RecordOddities(std::string file) : file_(std::move(file)) {}

    /// Notes one at byte column `column` of a line; `what` says it in full and is kept of the first
    /// of its kind.
    void note(Oddity oddity, const CsvLine& line, std::size_t column, const std::string& what);
    /// Counts `rows` that repeat earlier ones, the first at `line`.
    void note_repetition(const CsvLine& line, std::size_t rows);

    /// Warns of each kind at the first place where it was met, in the order of places.
    void warn(Diagnostics& diagnostics) const;
    /// Puts the counts into the notes.
    void count_into(RecordNotes& notes) const;

private:
    static constexpr std::size_t kKinds = 6;
    struct Kind {
        std::size_t times = 0;
        Place first;
        std::string what;
    };
    [[nodiscard]] const Kind& kind(Oddity oddity) const {
        return kinds_[static_cast<std::size_t>(oddity)];
    }

    std::string file_;
    std::array<Kind, kKinds> kinds_;
    std::size_t repeated_rows_ = 0;
};

}  // namespace rainledger
