#pragma once

#include <cstddef>
#include <string_view>
#include <vector>

#include "rain/csv_rows.hpp"
#include "rain/csv_text.hpp"
#include "rain/record_oddities.hpp"

// Rows of a record as they come: headers in the midst, rows that repeat earlier ones, and time
// going back.
namespace rainledger {

/// How far a stamp on a zone's clock may be misplaced: more than clocks usually go back by.
inline constexpr double kClockChange_ms = 2.0 * 3.6e6;

/// Lines of a text that are left out, line ends included.
struct LeftOut {
    const char* begin = nullptr;
    CsvLines behind;
};

/// Whether a row at the time of the row before may be the first to repeat earlier rows. Two tips
/// may well fall in one instant.
enum class SameTime { is_news, may_repeat };

class RecordOrder {
public:
    /// `header` is the header row. `slack` is how far a time may be misplaced where the clock shows
    /// it twice. Lines passed to the functions lie in one text that stays where it is.
    RecordOrder(std::string_view header, SameTime same_time, double slack,
                RecordOddities& oddities);

    /// The line is the header row again; then it is noted and left out. `lines` stands behind it.
    [[nodiscard]] bool leaves_out_header(const CsvLine& line, const CsvLines& lines);

    enum class Verdict {
        onward,   ///< time goes on
        back,     ///< time goes back, or stands still where that may repeat rows
        repeated  ///< rows from this one on repeat earlier ones up to the last, or to the end of
                  ///< the file: they are noted and left out, and `lines` stands behind them
    };
    [[nodiscard]] Verdict judge(const CsvLine& line, const RowTime& time, CsvLines& lines);

    /// The time of the row that the next one follows.
    [[nodiscard]] const RowTime& last() const { return last_; }
    [[nodiscard]] const std::vector<LeftOut>& left_out() const { return left_out_; }

private:
    /// A row to start looking from.
    struct Mark {
        double time = 0.0;
        CsvLine line;
        CsvLines behind;
    };

    void keep(const CsvLine& line, const RowTime& time, const CsvLines& lines);
    [[nodiscard]] bool is_header(std::string_view line) const;
    [[nodiscard]] bool next_kept(CsvLines& lines, CsvLine& line) const;
    [[nodiscard]] bool find_earlier(const CsvLine& line, double time, CsvLines& behind);
    [[nodiscard]] std::size_t count_repeated(const CsvLine& line, CsvLines earlier,
                                             CsvLines& later) const;

    std::string_view header_;
    SameTime same_time_;
    double slack_;
    RecordOddities& oddities_;
    std::size_t kept_ = 0;
    std::size_t looked_at_ = 0;
    RowTime last_;
    std::size_t since_mark_ = 0;
    std::vector<Mark> marks_;  // times rise
    std::vector<LeftOut> left_out_;
};

}  // namespace rainledger
