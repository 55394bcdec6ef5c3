// Two runs side by side in words, the same on the terminal and on the page.

#ifndef GATEDYNO_REPORT_VERSUS_TEXT_H_
#define GATEDYNO_REPORT_VERSUS_TEXT_H_

#include <string>
#include <vector>

#include "harness/compare/spread.h"
#include "harness/report/versus_view.h"

namespace gatedyno {

// What g is looked at to agree within: the method takes it for a number of the
// cell alone, and a tenth is what people who size gates by hand hope for
// (common practice, no source).
inline constexpr double kAgreement = 0.1;

// "g of 68 of 70 arcs agrees within 10 %: it changes by +1.2 % on average,
// standard deviation 3.4 %; 66 arcs changed by more than their uncertainty, and
// 3 verdicts differ."
std::string VersusSentence(const VersusView& view);

// "changed: g and p", "alike"; with hand numbers that differ, and what each
// side says where that is not the same.
std::string FindingText(const ArcPair& pair);

// "changed: g and p", without more.
std::string FindingHead(const ArcPair& pair);

// "typical", or "slow to fast" where the sides differ.
std::string CornerPairName(const CornerPair& pair);

// "±0.9 %": the expanded uncertainty of a change, rounded up; "" where it is
// not known.
std::string ExpandedText(const Change& change);

// "+2.8 % ±0.9 %".
std::string ChangeText(const Change& change);

// "14 %", "5.3 %"; "-" where there is none.
std::string DeviationText(const Spread& spread);

// Corners of a run that are not compared, a sentence each; empty where there
// are none.
std::vector<std::string> CornersLeftOut(const VersusView& view);

// What the reports warn of; with another node on the other side, that tau is
// the cards' too.
std::string VersusCaution(const VersusView& view);

// What is compared, in order: its name, and its change.
struct Compared {
  const char* name;
  RelativeChange change;
};
std::vector<Compared> ComparedFigures();

int CountFindings(const Versus& versus, Finding finding);
int CountVerdictsThatDiffer(const Versus& versus);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_VERSUS_TEXT_H_
