import { View } from "react-native";
import { Text, type TextProps } from "./Text";
import { unseen } from "./unseen";
import { webProps, webStyle } from "./webStyle";

export interface LiveTextProps extends TextProps {
  /** speak at once instead of when there is a pause */
  urgent?: boolean;
  /** only for screen readers */
  hidden?: boolean;
}

/** Words that are spoken when they change: states of the recorder, results. */
export function LiveText({ urgent = false, hidden = false, children, ...text }: LiveTextProps) {
  return (
    <View
      role={urgent ? "alert" : "status"}
      aria-live={urgent ? "assertive" : "polite"}
      {...webProps({ "aria-atomic": true })}
      style={hidden ? webStyle(unseen) : null}
    >
      <Text {...text}>{children}</Text>
    </View>
  );
}
